"use server";

import { defineAction } from "@/app/_server/define-action";
import { VoidFileInput } from "@/lib/proposals/schema";
import { voidFile } from "@/lib/proposals/files/void-file";

export const voidFileAction = defineAction(VoidFileInput, voidFile);

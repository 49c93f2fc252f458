"use server";

import { defineAction } from "@/app/_server/define-action";
import { SignSheetsInput } from "@/lib/proposals/schema";
import { signSheets } from "@/lib/proposals/signing/sign-sheets";

export const signSheetsAction = defineAction(SignSheetsInput, signSheets);

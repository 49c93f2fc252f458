"use server";

import { defineAction } from "@/app/_server/define-action";
import { makeBaseline } from "@/lib/products/make-baseline";
import { MakeBaselineInput } from "@/lib/products/schema";

export const makeBaselineAction = defineAction(MakeBaselineInput, makeBaseline);

"use server";

import { defineAction } from "@/app/_server/define-action";
import { carryForward } from "@/lib/proposals/submitting/carry-forward";
import { CarryForwardInput } from "@/lib/proposals/schema";

export const carryForwardAction = defineAction(CarryForwardInput, carryForward);

"use server";

import { z } from "zod";

import { defineAction } from "@/app/_server/define-action";
import { checkHouseHistory } from "@/lib/products/house-history";

export const checkHouseHistoryAction = defineAction(z.strictObject({}), (actor) => checkHouseHistory(actor));

"use server";

import { defineAction } from "@/app/_server/define-action";
import { checkHistory } from "@/lib/budget/product-history";

import { CheckHistoryInput } from "./_components/check-history-input";

export const checkHistoryAction = defineAction(CheckHistoryInput, (actor, { productCode, sequence, hash }) =>
  checkHistory(actor, productCode, sequence !== null && hash !== null ? { sequence, hash } : undefined),
);

import type { LineRevisionView } from "@/lib/budget/views";

import type { BudgetSheet } from "../_sheet/budget-sheet";
import { allocationMarginWorking, allocationWorking } from "./allocation-working";
import { causeWorking } from "./cause-working";
import { itemUncertaintyWorking } from "./item-uncertainty-working";
import { basicWorking, growthWorking, predictedWorking } from "./item-working";
import { groupWorking, limitWorking, totalWorking, withoutSavingsWorking } from "./total-working";
import { totalUncertaintyWorking } from "./total-uncertainty-working";
import type { FigureQuestion, Working } from "./working";

/** The working of any number on the sheet; null where the sheet has no such number. */
export function figureWorking(
  sheet: BudgetSheet,
  { figure, of, number }: FigureQuestion,
  allocationRevisions: readonly LineRevisionView[],
): Working | null {
  if (of === "total") return sheetWorking(sheet, figure);
  if (of === "cause") return causeWorking(sheet, number);
  const row = sheet.rows.find((candidate) => candidate.kind === of && candidate.number === number);
  if (!row) return null;

  switch (figure) {
    case "basic":
      return row.kind === "item" ? basicWorking(sheet, row) : groupWorking(sheet, row, figure);
    case "growth":
      return row.kind === "item" ? growthWorking(sheet, row) : groupWorking(sheet, row, figure);
    case "predicted":
      return row.kind === "item" ? predictedWorking(sheet, row) : groupWorking(sheet, row, figure);
    case "allocation":
      return allocationWorking(row, allocationRevisions);
    case "margin":
      return allocationMarginWorking(sheet, row);
    case "standardUncertainty":
      return row.kind === "item" ? itemUncertaintyWorking(sheet, row) : null;
    default:
      return null;
  }
}

function sheetWorking(sheet: BudgetSheet, figure: FigureQuestion["figure"]): Working | null {
  switch (figure) {
    case "basic":
    case "growth":
    case "predicted":
      return totalWorking(sheet, figure);
    case "predictedWithoutSavings":
      return withoutSavingsWorking(sheet);
    case "margin":
    case "clearOfReserve":
    case "limit":
    case "reserve":
    case "unallocated":
      return limitWorking(sheet, figure);
    case "interval":
    case "standardUncertainty":
    case "basicExceedsLimit":
    case "predictedExceedsLimit":
      return totalUncertaintyWorking(sheet, figure);
    case "allocation":
      return null;
  }
}

import type { BudgetSheet } from "../_sheet/budget-sheet";
import type { FigureQuestion } from "./working";

/** The force that a figure of the sheet is, in newtons; null for what is no force, or is none of the operating point's. */
export function figureNewtons(sheet: BudgetSheet, { figure, of, number }: FigureQuestion): number | null {
  if (of === "total") return totalNewtons(sheet, figure);
  const row = sheet.rows.find((candidate) => candidate.kind === of && candidate.number === number);
  if (!row || (row.kind === "item" && row.result.refused)) return null;
  switch (figure) {
    case "basic":
    case "growth":
    case "predicted":
      return row[figure];
    case "allocation":
      return row.allocationHundredths === null ? null : row.allocationHundredths / 100;
    case "margin":
      return row.marginHundredths === null ? null : row.marginHundredths / 100;
    default:
      return null;
  }
}

function totalNewtons({ point }: BudgetSheet, figure: FigureQuestion["figure"]): number | null {
  switch (figure) {
    case "basic":
    case "growth":
    case "predicted":
    case "predictedWithoutSavings":
    case "margin":
    case "clearOfReserve":
      return point.totals[figure];
    case "limit":
      return point.limitHundredths / 100;
    case "reserve":
      return point.reserveHundredths / 100;
    default:
      return null;
  }
}

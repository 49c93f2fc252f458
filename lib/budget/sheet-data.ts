import { allocationsView, type AllocationsView } from "@/lib/evaluation/budget/allocations-view";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import { type GroupSheetRow, type ItemSheetRow, type RowFigures, sheetRows } from "@/lib/evaluation/budget/sheet-rows";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import { type KeyFigure, keyFigures } from "@/lib/evaluation/lines/key-figures";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import { type MeasureBasis, measureBasis } from "@/lib/evaluation/measures/measure-basis";
import type { Note } from "@/lib/evaluation/notes/note";
import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import type { LineKind, ProductKind } from "@/lib/vocabulary/lines";
import type { UnitSystem } from "@/lib/units/us-customary";
import { type StoredPoint, totalsToStore } from "./stored-results";
import type { StoredUncertainty } from "./stored-uncertainty";

/** Whoever changes what a sheet's data holds or how it is put gives it the next number: kept ones are then made anew. */
export const SHEET_RECIPE = 1;

export interface ItemDataRow extends RowFigures {
  kind: "item";
  ownerId: number;
  method: ItemBody["method"];
  saving: boolean;
  /** Without a result: its one note says why. */
  refused: boolean;
  figures: Record<UnitSystem, KeyFigure[]>;
  notes: readonly Note[];
}

export interface GroupDataRow extends RowFigures {
  kind: "group";
  /** Items in it and in its subgroups. */
  members: number;
}

export type SheetDataRow = ItemDataRow | GroupDataRow;

/** An operating point's totals and standing, and what its forces are referred to. */
export type SheetPoint = StoredPoint & { basis: MeasureBasis };

/** ΣB's interval and both probabilities, without the items and causes that the uncertainty sheet lists. */
export type SheetUncertainty = Pick<PointUncertainty, "basic" | "basicExceedsLimit" | "predictedExceedsLimit">;

/** A budget sheet: the rows of the chosen operating point, and of the others the totals only. */
export interface SheetData {
  productCode: string;
  productKind: ProductKind;
  issue: number;
  /** The chosen operating point. */
  operatingPoint: string;
  referencePoint: string;
  worstPoint: string;
  points: SheetPoint[];
  rows: SheetDataRow[];
  allocations: Omit<AllocationsView, "lines">;
  /** null where the issue keeps none, or where an item is refused. */
  uncertainty: SheetUncertainty | null;
  retired: { kind: LineKind; number: string; name: string; letter: string; issue: number }[];
}

export interface SheetSource {
  issue: number;
  state: BudgetState;
  results: BudgetResults;
  uncertainty: StoredUncertainty | null;
}

/** The sheets of an issue, one to each operating point. */
export function sheetsOf(source: SheetSource): SheetData[] {
  const { issue, state, results } = source;
  const { code, kind } = state.product;
  const { terms, operatingPoints } = indexState(state);
  const points = totalsToStore(results).points.map((point) => {
    const hoursPerYear = operatingPoints.get(point.operatingPoint)?.hoursPerYear ?? null;
    return { ...point, basis: measureBasis(kind, terms, point.stream, hoursPerYear) };
  });
  const { lines: _lines, ...allocations } = allocationsView(state, results);
  const retired = state.lines
    .filter((line) => line.retired)
    .map((line) => ({
      kind: line.kind,
      number: line.number,
      name: lineName(line),
      letter: line.letter,
      issue: line.issue,
    }));
  return results.points.map((point) => ({
    productCode: code,
    productKind: kind,
    issue,
    operatingPoint: point.operatingPoint,
    referencePoint: terms.referenceOperatingPoint,
    worstPoint: results.worstPoint,
    points,
    rows: sheetRows(state, point).map(dataRow),
    allocations,
    uncertainty: uncertaintyAt(point.operatingPoint, source.uncertainty),
    retired,
  }));
}

function dataRow(row: ItemSheetRow | GroupSheetRow): SheetDataRow {
  if (row.kind === "group") {
    const { body: _body, members, ...figures } = row;
    return { ...figures, members: members.length };
  }
  const { body, result, ...figures } = row;
  return {
    ...figures,
    ownerId: body.ownerId,
    method: body.method,
    saving: body.saving,
    refused: result.refused !== null,
    figures: { si: keyFigures(body, result.answer, "si"), us: keyFigures(body, result.answer, "us") },
    notes: result.notes,
  };
}

function uncertaintyAt(operatingPoint: string, uncertainty: StoredUncertainty | null): SheetUncertainty | null {
  const outcome = uncertainty?.points.find((point) => point.operatingPoint === operatingPoint);
  if (!outcome || "refused" in outcome) return null;
  const { basic, basicExceedsLimit, predictedExceedsLimit } = outcome;
  return { basic, basicExceedsLimit, predictedExceedsLimit };
}

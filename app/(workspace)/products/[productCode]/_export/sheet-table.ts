import { utcMinuteText } from "@/app/_components/utc-text";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { isKept, NEWTONS, type Reading, readValue } from "@/lib/evaluation/measures/reading";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { roundStored, toHundredths } from "@/lib/units/rounding";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

import { approvedBy, proposedBy } from "../_components/sheet-fields";
import type { BudgetSheet, ItemRow } from "../_sheet/budget-sheet";
import { serviceWindText } from "../_sheet/service-wind-text";

export type ExportCell = string | number | null;

/** A budget sheet for other programs: one row per item, the unit of each number in its header. */
export interface ExportTable {
  headers: string[];
  rows: ExportCell[][];
  /** The title block, and what the numbers are not. */
  about: [label: string, value: string][];
}

type Column = [header: string, of: (row: ItemRow, sheet: BudgetSheet) => ExportCell];

const COLUMNS: readonly Column[] = [
  ["Item", ({ number }) => number],
  ["Name", ({ name }) => name],
  ["Group", ({ body }, { indexed }) => groupName(body.group, indexed.groups)],
  ["Owner", ({ owner }) => owner],
  ["Method", ({ body }) => ITEM_METHODS[body.method].label],
  ["Method version", ({ result }) => result.methodVersion],
  ["Revision", ({ letter }) => letter],
  ["Maturity grade", ({ body }) => MATURITY_GRADE_NAMES[body.grade]],
  ["Basic [N]", (row) => orNone(row, row.basic)],
  ["Growth [fraction of basic]", (row) => (row.result.refused ? null : row.result.growthFraction)],
  ["Growth [N]", (row) => orNone(row, row.growth)],
  ["Predicted [N]", (row) => orNone(row, row.predicted)],
  ["Allocation at the reference point [N]", ({ allocationHundredths }) => newtons(allocationHundredths)],
  ["Margin [N]", ({ marginHundredths }, { isReference }) => (isReference ? newtons(marginHundredths) : null)],
  ["Predicted drag area [m²]", (row, { point }) => dragArea(row, point.stream.dynamicPressure)],
  ["Reynolds number [1]", ({ result }) => result.answer?.reynolds ?? null],
  ["Mean friction coefficient [1]", ({ result }) => result.answer?.meanCoefficient ?? null],
  ["Notes", ({ result }) => result.notes.map(noteSentence).join(" ")],
];

/**
 * The sheet with every force in newtons, which are kept and add up, and where it is read in another measure the same
 * forces in that beside them.
 */
export function sheetTable(sheet: BudgetSheet, reading: Reading = NEWTONS): ExportTable {
  const { budget, point } = sheet;
  const columns = [...COLUMNS.slice(0, -1), ...readColumns(reading), ...COLUMNS.slice(-1)];
  const { product, issue } = budget;
  const caution = serviceWindText(product.kind);
  const place: ExportCell[] = [product.code, issue.number, point.operatingPoint];
  const close: ExportCell[] = caution === null ? [] : [caution];
  const items = sheet.rows.filter((row): row is ItemRow => row.kind === "item");

  return {
    headers: [
      ...["Product", "Issue", "Operating point"],
      ...columns.map(([header]) => header),
      ...(caution === null ? [] : ["Caution"]),
    ],
    rows: [...items.map((row) => columns.map(([, of]) => of(row, sheet))), totalRow(sheet, columns, reading)].map(
      (row) => [...place, ...row, ...close],
    ),
    about: [
      ["Product", `${product.code} ${product.name}`],
      ["Issue", String(issue.number)],
      ["Issued", utcMinuteText(issue.at)],
      ["Operating point", `${point.operatingPoint} ${point.name}`],
      ...readAbout(reading),
      ["Proposed", proposedBy(issue)],
      ["Approved", approvedBy(issue)],
      ["Content hash", issue.contentHash],
      ...(caution === null ? [] : [["Caution", caution] satisfies [string, string]]),
    ],
  };
}

/** Forces that a measure reads; what has no force has no reading. */
const READ_FIGURES: readonly [label: string, of: (row: ItemRow, sheet: BudgetSheet) => number | null][] = [
  ["Basic", (row) => (row.result.refused ? null : row.basic)],
  ["Growth", (row) => (row.result.refused ? null : row.growth)],
  ["Predicted", (row) => (row.result.refused ? null : row.predicted)],
  ["Margin", ({ marginHundredths }, { isReference }) => (isReference ? newtons(marginHundredths) : null)],
];

function readColumns(reading: Reading): Column[] {
  if (isKept(reading)) return [];
  return READ_FIGURES.map(([label, of]): Column => {
    const value = (row: ItemRow, sheet: BudgetSheet): ExportCell => {
      const force = of(row, sheet);
      return force === null ? null : readValue(reading, force);
    };
    return [readHeader(label, reading), value];
  });
}

/** "Predicted, counts [counts]": the measure beside the unit, so that no two columns have one name. */
function readHeader(label: string, { measure, unit }: Reading): string {
  return `${label}, ${MEASURE_NAMES[measure].toLowerCase()} [${unit === "" ? "1" : unit}]`;
}

function readAbout(reading: Reading): [string, string][] {
  if (isKept(reading)) return [];
  const { measure, basis } = reading;
  return [["Read in", `${MEASURE_NAMES[measure]}${basis ? `, ${basis}` : ""}; newtons are kept, and decide`]];
}

function totalRow({ point }: BudgetSheet, columns: readonly Column[], reading: Reading): ExportCell[] {
  const { basic, growth, predicted } = point.totals;
  const figures = new Map<string, ExportCell>([
    ["Item", "total"],
    ["Basic [N]", toHundredths(basic) / 100],
    ["Growth [N]", toHundredths(growth) / 100],
    ["Predicted [N]", toHundredths(predicted) / 100],
    ["Predicted drag area [m²]", roundStored(predicted / point.stream.dynamicPressure)],
    [readHeader("Basic", reading), readValue(reading, basic)],
    [readHeader("Growth", reading), readValue(reading, growth)],
    [readHeader("Predicted", reading), readValue(reading, predicted)],
  ]);
  return columns.map(([header]) => figures.get(header) ?? null);
}

/** To 0.01 N, as the sheet prints it; nothing where the item is refused. */
function orNone({ result }: ItemRow, value: number): number | null {
  return result.refused ? null : toHundredths(value) / 100;
}

function newtons(hundredths: number | null): number | null {
  return hundredths === null ? null : hundredths / 100;
}

function dragArea({ result, predicted }: ItemRow, dynamicPressure: number): number | null {
  return result.refused ? null : roundStored(predicted / dynamicPressure);
}

function groupName(group: string | null, groups: BudgetSheet["indexed"]["groups"]): string | null {
  return group === null ? null : `${group} ${groups.get(group)?.name ?? ""}`.trim();
}

import type { BudgetAt } from "@/lib/budget/views";
import { groupsAboveItem } from "@/lib/evaluation/budget/group-tree";
import { type IndexedState, indexState } from "@/lib/evaluation/budget/indexed-state";
import type { ItemResult, PointResult } from "@/lib/evaluation/budget/results";
import { type SheetRow, sheetOrder } from "@/lib/evaluation/budget/sheet-order";
import type { GroupBody } from "@/lib/evaluation/lines/group-body";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { type MeasureBasis, measureBasis } from "@/lib/evaluation/measures/measure-basis";
import type { PointUncertaintyOutcome } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { roundStored, toHundredths } from "@/lib/units/rounding";

interface RowFigures {
  number: string;
  name: string;
  letter: string;
  depth: number;
  basic: number;
  growth: number;
  predicted: number;
  /** null where the sheet has no row for it. */
  allocationHundredths: number | null;
  /** Allocation less predicted, both as printed; null without an allocation or where an item is refused. */
  marginHundredths: number | null;
}

export interface ItemRow extends RowFigures {
  kind: "item";
  body: ItemBody;
  owner: string;
  result: ItemResult;
}

export interface GroupRow extends RowFigures {
  kind: "group";
  body: GroupBody;
  /** Numbers of the items in it and in its subgroups. */
  members: string[];
}

export type BudgetRow = ItemRow | GroupRow;

/** A budget at one operating point as its sheet shows it. */
export interface BudgetSheet {
  budget: BudgetAt;
  indexed: IndexedState;
  point: PointResult;
  /** To first order, as the issue froze it; null where it keeps nothing of it. */
  uncertainty: PointUncertaintyOutcome | null;
  /** Allocations are set at the reference operating point; at another one a margin is no flag. */
  isReference: boolean;
  /** Groups ahead of what they hold. */
  rows: BudgetRow[];
  retired: LineState[];
}

/** The operating point asked for, else the one that stands worst. */
export function pointOf(budget: BudgetAt, asked: string | undefined): PointResult | undefined {
  const { points, worstPoint } = budget.results;
  return points.find(({ operatingPoint }) => operatingPoint === (asked ?? worstPoint));
}

export function budgetSheet(budget: BudgetAt, point: PointResult): BudgetSheet {
  const indexed = indexState(budget.state);
  const uncertainty = budget.uncertainty?.points.find((each) => each.operatingPoint === point.operatingPoint) ?? null;
  const context: RowContext = {
    indexed,
    results: new Map(point.items.map((result) => [result.item, result])),
    letters: new Map(budget.state.lines.map((line) => [`${line.kind} ${line.number}`, line.letter])),
    people: new Map(budget.people.map(({ id, name }) => [id, name])),
    uncertainties: uncertaintiesOf(uncertainty),
  };

  return {
    budget,
    indexed,
    point,
    uncertainty,
    isReference: indexed.terms.referenceOperatingPoint === point.operatingPoint,
    rows: sheetOrder(indexed).flatMap((row) => rowOf(row, context) ?? []),
    retired: budget.state.lines.filter(({ retired }) => retired),
  };
}

/** What the forces of the sheet are referred to when they are read in another measure. */
export function sheetBasis({ budget, indexed, point }: BudgetSheet): MeasureBasis {
  const hoursPerYear = indexed.operatingPoints.get(point.operatingPoint)?.hoursPerYear ?? null;
  return measureBasis(budget.product.kind, indexed.terms, point.stream, hoursPerYear);
}

interface RowContext {
  indexed: IndexedState;
  results: ReadonlyMap<string, ItemResult>;
  letters: ReadonlyMap<string, string>;
  people: ReadonlyMap<number, string>;
  /** N, by the item's number. */
  uncertainties: ReadonlyMap<string, number>;
}

function uncertaintiesOf(outcome: PointUncertaintyOutcome | null): ReadonlyMap<string, number> {
  if (outcome === null || "refused" in outcome) return new Map();
  return new Map(outcome.items.map(({ item, standardUncertainty }) => [item, standardUncertainty]));
}

/** A result is kept without its uncertainty: that stands with the issue, where what items share is counted once. */
function withUncertainty(result: ItemResult, standardUncertainty: number | undefined): ItemResult {
  if (!result.answer || standardUncertainty === undefined) return result;
  return { ...result, answer: { ...result.answer, standardUncertainty } };
}

function rowOf({ kind, number, depth }: SheetRow, context: RowContext): BudgetRow | null {
  const letter = context.letters.get(`${kind} ${number}`) ?? "–";
  return kind === "item" ? itemRow(number, depth, letter, context) : groupRow(number, depth, letter, context);
}

function itemRow(number: string, depth: number, letter: string, context: RowContext): ItemRow | null {
  const body = context.indexed.items.get(number);
  const result = context.results.get(number);
  if (!body || !result) return null;
  const { basic, growth, predicted } = result;

  return {
    kind: "item",
    number,
    name: body.name,
    letter,
    depth,
    basic,
    growth,
    predicted,
    ...allocationOf("item", number, result.refused ? null : predicted, context.indexed),
    body,
    owner: context.people.get(body.ownerId) ?? `person ${body.ownerId}`,
    result: withUncertainty(result, context.uncertainties.get(number)),
  };
}

function groupRow(number: string, depth: number, letter: string, context: RowContext): GroupRow | null {
  const { indexed, results } = context;
  const body = indexed.groups.get(number);
  if (!body) return null;
  const members = [...indexed.items.keys()].filter((item) => groupsAboveItem(indexed, item).includes(number));
  const found = members.flatMap((member) => results.get(member) ?? []);
  const sum = (pick: (result: ItemResult) => number) =>
    roundStored(found.reduce((total, result) => total + pick(result), 0));
  const predicted = sum((result) => result.predicted);

  return {
    kind: "group",
    number,
    name: body.name,
    letter,
    depth,
    basic: sum((result) => result.basic),
    growth: sum((result) => result.growth),
    predicted,
    ...allocationOf("group", number, found.some(({ refused }) => refused) ? null : predicted, indexed),
    body,
    members,
  };
}

function allocationOf(kind: "item" | "group", number: string, predicted: number | null, { allocations }: IndexedState) {
  const row = allocations.rows.find((entry) => entry.kind === kind && entry.number === number);
  const allocationHundredths = row?.hundredths ?? null;
  return {
    allocationHundredths,
    marginHundredths:
      allocationHundredths === null || predicted === null ? null : allocationHundredths - toHundredths(predicted),
  };
}

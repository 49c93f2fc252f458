import { roundStored, toHundredths } from "@/lib/units/rounding";
import type { GroupBody } from "../lines/group-body";
import type { ItemBody } from "../lines/item-body";
import type { BudgetState } from "../lines/line-state";
import { keyOf } from "./allocation-sheet";
import { itemsOfGroup } from "./group-tree";
import { indexState, type IndexedState } from "./indexed-state";
import type { ItemResult, PointResult } from "./results";
import { resultsByItem } from "./results-by-item";
import { sheetOrder } from "./sheet-order";

export interface RowFigures {
  number: string;
  name: string;
  letter: string;
  /** How many groups it stands in. */
  depth: number;
  basic: number;
  growth: number;
  predicted: number;
  /** null where the sheet has no row for it. */
  allocationHundredths: number | null;
  /** Allocation less predicted, both as printed; null without an allocation or where an item is refused. */
  marginHundredths: number | null;
}

export interface ItemSheetRow extends RowFigures {
  kind: "item";
  body: ItemBody;
  result: ItemResult;
}

export interface GroupSheetRow extends RowFigures {
  kind: "group";
  body: GroupBody;
  /** Numbers of the items in it and in its subgroups. */
  members: readonly string[];
}

/** The rows of the budget sheet at one operating point, groups ahead of what they hold. */
export function sheetRows(state: BudgetState, point: PointResult): (ItemSheetRow | GroupSheetRow)[] {
  const indexed = indexState(state);
  const context: RowContext = {
    indexed,
    results: resultsByItem(point),
    letters: new Map(state.lines.map((line) => [`${line.kind} ${line.number}`, line.letter])),
    allocations: new Map(indexed.allocations.rows.map((row) => [keyOf(row.kind, row.number), row.hundredths])),
  };
  return sheetOrder(indexed).flatMap(({ kind, number, depth }) => {
    const letter = context.letters.get(`${kind} ${number}`) ?? "–";
    const row = kind === "item" ? itemRow(number, context) : groupRow(number, context);
    return row === null ? [] : [{ ...row, letter, depth }];
  });
}

interface RowContext {
  indexed: IndexedState;
  results: ReadonlyMap<string, ItemResult>;
  letters: ReadonlyMap<string, string>;
  allocations: ReadonlyMap<string, number>;
}

function itemRow(number: string, context: RowContext): Omit<ItemSheetRow, "letter" | "depth"> | null {
  const body = context.indexed.items.get(number);
  const result = context.results.get(number);
  if (!body || !result) return null;

  const { basic, growth, predicted, refused } = result;
  const allocation = allocationOf("item", number, refused ? null : predicted, context);
  return { kind: "item", number, name: body.name, basic, growth, predicted, ...allocation, body, result };
}

function groupRow(number: string, context: RowContext): Omit<GroupSheetRow, "letter" | "depth"> | null {
  const { indexed, results } = context;
  const body = indexed.groups.get(number);
  if (!body) return null;

  const members = itemsOfGroup(indexed, number);
  const found = members.flatMap((member) => results.get(member) ?? []);
  const sum = (figure: "basic" | "growth" | "predicted") =>
    roundStored(found.reduce((total, result) => total + result[figure], 0));
  const predicted = sum("predicted");
  const isRefused = found.some(({ refused }) => refused);
  return {
    kind: "group",
    number,
    name: body.name,
    basic: sum("basic"),
    growth: sum("growth"),
    predicted,
    ...allocationOf("group", number, isRefused ? null : predicted, context),
    body,
    members,
  };
}

function allocationOf(
  kind: "item" | "group",
  number: string,
  predicted: number | null,
  { allocations }: RowContext,
): Pick<RowFigures, "allocationHundredths" | "marginHundredths"> {
  const held = allocations.get(keyOf(kind, number)) ?? null;
  const margin = held === null || predicted === null ? null : held - toHundredths(predicted);
  return { allocationHundredths: held, marginHundredths: margin };
}

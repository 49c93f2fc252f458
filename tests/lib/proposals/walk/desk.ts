import type { DraftContent } from "@/lib/proposals/schema";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { addItem, fixedItem } from "@/tests/support/budget-on-file";
import { lineOf, type ModelContent, type ModelEdit } from "./model-budget";
import type { ModelCapacity, ModelState } from "./model-state";
import type { Side } from "./model";

/** What can be done to the product, on files or in memory. Each act answers whether it was allowed. */
export interface Desk {
  passDays(days: number): void;
  start(who: string): Promise<boolean>;
  save(who: string, proposal: number, content: ModelContent): Promise<boolean>;
  propose(who: string, proposal: number): Promise<boolean>;
  approve(who: string, proposal: number, capacity: ModelCapacity): Promise<boolean>;
  sendBack(who: string, proposal: number, capacity: ModelCapacity): Promise<boolean>;
  disapprove(who: string, proposal: number): Promise<boolean>;
  takeBack(who: string, proposal: number): Promise<boolean>;
  withdraw(who: string, proposal: number): Promise<boolean>;
  share(who: string, proposal: number, to: string): Promise<boolean>;
  ask(who: string, proposal: number): Promise<boolean>;
  settle(who: string, proposal: number, request: number): Promise<boolean>;
  object(who: string, proposal: number): Promise<boolean>;
  carry(who: string, proposal: number, side: Side): Promise<boolean>;
  picture(): Promise<Picture>;
}

/** What can be seen of either side after each act. */
export interface Picture {
  issues: number;
  proposals: { state: ModelState; rounds: number }[];
  limit: number;
  reserve: number;
  rows: Record<string, number>;
  unallocated: number;
  items: Record<string, { owner: string; force: number; group: string | null; retired: boolean; revision: number }>;
}

/** A change of the model as the editor would send it, on the lines as they stand. */
export function typed(content: ModelContent, { lines }: BudgetState, ids: Record<string, number>): DraftContent {
  const edits = content.edits.map((edit) => {
    const [kind, number] = keyOf(edit);
    const line = lines.find((each) => each.kind === kind && each.number === number);
    return typedEdit(edit, line, ids) as DraftContent["edits"][number];
  });
  return { title: "A walk", reason: "At random.", neededBy: null, edits, transfers: content.transfers };
}

function keyOf(edit: ModelEdit): [LineState["kind"], string] {
  const [kind, number = ""] = lineOf(edit).split(" ");
  if (kind === "point") return ["operating_point", "OP-1"];
  return kind === "terms" ? ["terms", "TM"] : [kind === "item" ? "item" : "group", number];
}

function typedEdit(edit: ModelEdit, line: LineState | undefined, ids: Record<string, number>) {
  const [kind, number] = keyOf(edit);
  if (edit.what === "add") {
    const { owner, force, group, saving } = edit.body;
    return addItem(number, fixedItem(ids[owner] ?? 0, force / 100, { group, saving }));
  }
  const base = { kind, number, baseLetter: line?.letter ?? "–" };
  if (edit.what === "retire" || edit.what === "reinstate") return { ...base, operation: edit.what, body: null };
  return { ...base, operation: "revise", body: { ...line?.body, ...fieldTyped(edit, ids) } };
}

function fieldTyped(edit: Extract<ModelEdit, { to: unknown }>, ids: Record<string, number>): object {
  switch (edit.what) {
    case "force":
      return { force: { value: edit.to / 100 } };
    case "owner":
      return { ownerId: ids[edit.to] };
    case "limit":
      return { limitHundredths: edit.to };
    case "reserve":
      return { reserves: [{ operatingPoint: "OP-1", hundredths: edit.to }] };
    default:
      return { [edit.what]: edit.to };
  }
}

import { adoptedVersion } from "@/lib/evaluation/budget/adopted-versions";
import { findLine } from "@/lib/evaluation/budget/indexed-state";
import { newFinish } from "@/lib/evaluation/lines/finish-body";
import { newGroup } from "@/lib/evaluation/lines/group-body";
import type { MethodName } from "@/lib/evaluation/lines/item-body";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";
import { FIRST_METHOD_VERSION } from "@/lib/evaluation/methods/method-versions";
import type { DraftEdit } from "@/lib/proposals/schema";

import { asRecord, type Body } from "./body";

export type NewLineKind = "item" | "group" | "operating_point" | "finish";

/** An edit that starts from a line as it stands. */
export function reviseEdit(line: LineState, operation: "revise" | "retire" | "reinstate"): DraftEdit {
  const { kind, number, letter } = line;

  return { operation, kind, number, baseLetter: letter, body: operation === "retire" ? null : asRecord(line.body) };
}

export function addEdit(kind: NewLineKind, number: string, state: BudgetState, ownerId: number): DraftEdit {
  return { operation: "add", kind, number, baseLetter: null, body: asRecord(template(kind, state, ownerId)) };
}

/** A new line with the fields of another. An item's evidence and grade are its own: the copy starts as an estimate. */
export function copyEdit(line: LineState, kind: NewLineKind, number: string, ownerId: number): DraftEdit {
  const body = asRecord(line.body);
  const name = `${lineName(line).slice(0, 110)}, copy`;
  const own: Body = kind === "item" ? { ownerId, grade: "estimated", evidence: [], justifications: [] } : {};
  return { operation: "add", kind, number, baseLetter: null, body: { ...body, name, ...own } };
}

function template(kind: NewLineKind, state: BudgetState, ownerId: number): object {
  const order = (state.lines.filter((line) => line.kind === kind).length + 1) * 10;
  if (kind === "item") {
    const method = "flat-plate-friction";
    const fresh = ITEM_METHODS[method].template({ ownerId, order, group: null });
    return { ...fresh, methodVersion: adoptedVersion(state, method) };
  }
  if (kind === "group") return newGroup(order);

  return kind === "finish" ? newFinish() : newOperatingPoint();
}

/**
 * Another method: what both methods have stays as typed, the rest starts from the new one's defaults.
 *
 * @param state the budget whose versions count; null outside of one
 */
export function withMethod(body: Body, method: string, state: BudgetState | null): Body {
  const name: MethodName | undefined = METHOD_NAMES.find((known) => known === method);
  if (!name) return body;
  const fresh = asRecord(ITEM_METHODS[name].template({ ownerId: 0, order: 0, group: null }));
  const kept = Object.fromEntries(Object.keys(fresh).map((key) => [key, body[key] ?? fresh[key] ?? null]));

  const methodVersion = state ? adoptedVersion(state, name) : FIRST_METHOD_VERSION;
  return { ...kept, method: name, methodVersion };
}

/** The body that a line has before the edit; null for a new one. */
export function bodyBefore(edit: DraftEdit, state: BudgetState): Body | null {
  const line = findLine(state, edit.kind, edit.number);

  return edit.operation === "add" || !line ? null : asRecord(line.body);
}

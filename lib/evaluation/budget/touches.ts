import type { BudgetState, LineOf, LineState } from "../lines/line-state";
import type { MethodName } from "../methods/method-name";
import type { LineEdit } from "./edits";
import { findLine } from "./indexed-state";

/** One change that reaches several items at once, and every item that it reaches, moved or not. */
export type Touch = { items: string[] } & (
  { by: "finish"; number: string; name: string } | { by: "method-version"; method: MethodName; version: number }
);

/** The finishes and the versions of methods that a change touches. */
export function touchesOf(before: BudgetState, after: BudgetState, edits: readonly LineEdit[]): Touch[] {
  return [...finishTouches(before, after, edits), ...versionTouches(before, after, edits)];
}

function finishTouches(before: BudgetState, after: BudgetState, edits: readonly LineEdit[]): Touch[] {
  return edits
    .filter(({ kind, operation }) => kind === "finish" && operation !== "add")
    .flatMap(({ number }): Touch[] => {
      const line = findLine(after, "finish", number);
      if (line?.kind !== "finish") return [];
      const items = new Set([...itemsOfFinish(before.lines, number), ...itemsOfFinish(after.lines, number)]);
      return [{ by: "finish", number, name: line.body.name, items: [...items] }];
    });
}

/** Numbers of the items in force that name a finish. */
export function itemsOfFinish(lines: readonly LineState[], finish: string): string[] {
  return itemsInForce(lines)
    .filter(({ body }) => "finish" in body && body.finish === finish)
    .map(({ number }) => number);
}

/** Items that keep their method and get another version of it. */
function versionTouches(before: BudgetState, after: BudgetState, edits: readonly LineEdit[]): Touch[] {
  const touches = new Map<string, Extract<Touch, { by: "method-version" }>>();
  for (const { kind, number } of edits) {
    const [was, now] = [findLine(before, kind, number), findLine(after, kind, number)];
    if (was?.kind !== "item" || now?.kind !== "item" || was.body.method !== now.body.method) continue;
    const { method, methodVersion: version } = now.body;
    if (was.body.methodVersion === version) continue;
    const key = `${method} ${version}`;
    const touch = touches.get(key) ?? { by: "method-version", method, version, items: [] };
    touches.set(key, { ...touch, items: [...touch.items, number] });
  }
  return [...touches.values()];
}

function itemsInForce(lines: readonly LineState[]): LineOf<"item">[] {
  return lines.filter((line): line is LineOf<"item"> => line.kind === "item" && !line.retired);
}

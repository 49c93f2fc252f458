import type { BudgetState } from "../lines/line-state";
import type { MethodName } from "../methods/method-name";
import { FIRST_METHOD_VERSION } from "../methods/method-versions";

/**
 * The version by which a new item of a method is computed: the newest that any item in force has. A budget that adopted
 * none keeps to the first one; another is never slipped in by adding an item.
 */
export function adoptedVersion(state: BudgetState, method: MethodName): number {
  const versions = state.lines.flatMap((line) =>
    line.kind === "item" && !line.retired && line.body.method === method ? [line.body.methodVersion] : [],
  );
  return Math.max(FIRST_METHOD_VERSION, ...versions);
}

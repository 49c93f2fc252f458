import type { BudgetState, LineState } from "../lines/line-state";
import { newestVersionOf } from "../methods/method-versions";

/** The same lines, each item by the newest version of its method: what adopting it would give. */
export function withNewestVersions(state: BudgetState): BudgetState {
  return { ...state, lines: state.lines.map(withNewestVersion) };
}

function withNewestVersion(line: LineState): LineState {
  if (line.kind !== "item") return line;
  return { ...line, body: { ...line.body, methodVersion: newestVersionOf(line.body.method) } };
}

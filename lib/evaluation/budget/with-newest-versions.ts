import type { BudgetState, LineState } from "../lines/line-state";
import { CURRENT_METHOD_VERSIONS } from "../methods/method-registry";

/** The same lines, each item by the newest version of its method: what adopting it would give. */
export function withNewestVersions(state: BudgetState): BudgetState {
  return { ...state, lines: state.lines.map(withNewestVersion) };
}

function withNewestVersion(line: LineState): LineState {
  if (line.kind !== "item") return line;
  const methodVersion = CURRENT_METHOD_VERSIONS[line.body.method];
  return { ...line, body: { ...line.body, methodVersion } };
}

import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import type { LineKind } from "@/lib/vocabulary/lines";
import { budgetState } from "@/tests/support/budget-state";

const AIR = {
  name: "Cruise",
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const COMMON = { ownerId: 1, grade: "estimated", methodVersion: 1 };
export const PLATE = {
  ...COMMON,
  name: "plate",
  order: 10,
  method: "flat-plate-friction",
  length: { value: 2.4 },
  breadth: { value: 0.95 },
  faces: 2,
  finish: "F10",
};
const BEHIND = { ...PLATE, order: 20, length: { value: 3.6 }, liesBehind: "010", runUpFollows: true };
export const FIXED = {
  ...COMMON,
  name: "fixed",
  order: 30,
  method: "fixed",
  force: { value: 4 },
  source: "judgement",
  group: "G10",
};
const SHARE = { ...COMMON, name: "share", order: 90, method: "share", fraction: 0.1, of: ["010"], source: "judgement" };
const PAINT = { name: "paint", roughness: { value: 6e-6 }, source: "judgement" };
const SECOND = { ...AIR, name: "Slow", speed: { value: 12 } };
const GROUP = { name: "Cab", order: 10 };

export const STATE = budgetState({
  code: "T-1",
  name: "Test",
  kind: "vehicle_fairing",
  point: AIR,
  otherPoints: { "OP-2": SECOND },
  limitHundredths: 10000,
  reserveHundredths: 500,
  groups: { G10: GROUP, G20: { name: "Roof", parent: "G10", order: 20 } },
  finishes: { F10: PAINT, F20: { ...PAINT, name: "spare" } },
  items: { "010": PLATE, "020": BEHIND, "030": FIXED, "090": SHARE },
});

export function bodyOf(state: BudgetState, kind: LineKind, number: string): object {
  const found = state.lines.find((each) => each.kind === kind && each.number === number);
  if (!found) throw new Error(`no ${kind} ${number}`);
  return found.body;
}

export function add(kind: LineKind, number: string, body: object): LineEdit {
  return { operation: "add", kind, number, baseLetter: null, body };
}

export function revise(kind: LineKind, number: string, change: object): LineEdit {
  return { operation: "revise", kind, number, baseLetter: "–", body: { ...bodyOf(STATE, kind, number), ...change } };
}

export function retire(kind: LineKind, number: string): LineEdit {
  return { operation: "retire", kind, number, baseLetter: "–", body: null };
}

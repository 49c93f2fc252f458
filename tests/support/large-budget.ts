import { budgetState } from "./budget-state";

export const ITEMS = 500;
export const GROUPS = 12;
export const POINTS = ["OP-1", "OP-2", "OP-3", "OP-4", "OP-5"] as const;

/** Every ten items stand together: plates in pairs, a body, and what tells blocks apart. */
const IN_A_BLOCK = 10;
const AIR = { fluid: "air", staticTemperature: { value: 288.15 }, staticPressure: { value: 101325 } };
const SPEEDS = { "OP-1": 25, "OP-2": 15, "OP-3": 10, "OP-4": 20, "OP-5": 30 } as const;

/** A budget of 500 items at five operating points in twelve groups, each of which ends with a share of itself. */
export function largeBudget() {
  return budgetState({
    code: "LB-1",
    name: "Large",
    kind: "other_body",
    point: pointSketch("OP-1"),
    otherPoints: Object.fromEntries(
      POINTS.slice(1).map((number) => [number, { name: number, ...pointSketch(number) }]),
    ),
    limitHundredths: 10_000_000,
    reserveHundredths: 100_000,
    groups: groupSketches(),
    finishes: FINISHES,
    items: itemSketches(1),
  });
}

export function pointSketch(number: keyof typeof SPEEDS) {
  return { ...AIR, speed: { value: SPEEDS[number] }, hoursPerYear: 400 };
}

export const FINISHES = {
  B1: { name: "paint", roughness: { value: 6e-6 }, source: "judgement" },
  B2: { name: "galvanised", roughness: { value: 1.5e-4 }, source: "judgement" },
};

export function groupSketches(): Record<string, object> {
  return Object.fromEntries(
    Array.from({ length: GROUPS }, (_, index) => [groupNumber(index), { name: `Group ${index}`, order: index }]),
  );
}

export function itemSketches(ownerId: number): Record<string, object> {
  return Object.fromEntries(
    Array.from({ length: ITEMS }, (_, index) => [itemNumber(index), { ...itemSketch(index), ownerId }]),
  );
}

export function itemNumber(index: number): string {
  return String(1000 + index);
}

function groupNumber(index: number): string {
  return `G${String(index).padStart(2, "0")}`;
}

function groupOf(index: number): number {
  return Math.floor((Math.floor(index / IN_A_BLOCK) * GROUPS * IN_A_BLOCK) / ITEMS);
}

function itemSketch(index: number): object {
  const place = index % IN_A_BLOCK;
  const group = groupNumber(groupOf(index));
  const common = { name: `Item ${index}`, order: index, group, grade: "estimated", methodVersion: 1 };
  if (place === IN_A_BLOCK - 1) return { ...common, ...lastOfBlock(index, group), source: "judgement" };
  if (place === IN_A_BLOCK - 2) return { ...common, ...body(index), source: "judgement" };
  return { ...common, ...plate(index), ...(place % 2 === 1 ? behind(index - 1) : {}) };
}

/** A share of the group where it ends, else in turn a fixed force and a drag area. */
function lastOfBlock(index: number, group: string): object {
  if (groupOf(index + 1) !== groupOf(index)) return { group: null, method: "share", fraction: 0.05, ofGroup: group };
  const isOdd = Math.floor(index / IN_A_BLOCK) % 2 === 1;
  return isOdd ? { method: "fixed", force: { value: 1 } } : { method: "drag-area", dragArea: { value: 0.002 } };
}

function body(index: number): object {
  return { method: "bluff-body", dragCoefficient: 0.4, referenceArea: { value: 0.01 + index / 1e4 } };
}

function plate(index: number): object {
  const size = { length: { value: 1 + index / 100 }, breadth: { value: 0.5 }, faces: 1 };
  // One plate in five hundred has the second finish.
  return { method: "flat-plate-friction", ...size, finish: index === 100 ? "B2" : "B1" };
}

function behind(index: number): object {
  return { liesBehind: itemNumber(index), runUpFollows: true };
}

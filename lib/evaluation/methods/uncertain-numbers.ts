import type { UncertainNumber } from "../document/number-input";

export interface PlacedNumber {
  /** `transition.criticalReynolds` */
  path: string;
  number: UncertainNumber;
}

/** Every number of an input that was given with a standard uncertainty, in the order of its fields. */
export function uncertainNumbers(node: unknown, path = ""): PlacedNumber[] {
  if (typeof node !== "object" || node === null) return [];
  if (isUncertain(node)) return [{ path, number: node }];
  return Object.entries(node).flatMap(([key, value]) => uncertainNumbers(value, path === "" ? key : `${path}.${key}`));
}

function isUncertain(node: object): node is UncertainNumber {
  return "standardUncertainty" in node && "value" in node;
}

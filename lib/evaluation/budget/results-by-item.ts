import { oncePer } from "./once-per";
import type { ItemResult, PointResult } from "./results";

/** The results at an operating point by item. */
export const resultsByItem = oncePer(
  (point: PointResult): ReadonlyMap<string, ItemResult> => new Map(point.items.map((result) => [result.item, result])),
);

/** Two numbers are the same to this part of the greater one. */
const TOLERANCE = 1e-10;

/** A number of an issue that comes out otherwise when it is computed again. */
export interface RecomputedDifference {
  operatingPoint: string;
  /** Empty for a number of the total. */
  item: string;
  quantity: string;
  stored: number;
  recomputed: number;
}

/**
 * Whether two numbers are the same.
 *
 * @param least of what size a difference is counted at least: for what a sum may leave near 0
 */
export function agree(one: number, other: number, least = 0): boolean {
  return Math.abs(one - other) <= TOLERANCE * Math.max(Math.abs(one), Math.abs(other), least);
}

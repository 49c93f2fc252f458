import { expect } from "vitest";

/** Agreement within a relative tolerance; where 0 is expected, within 1e-12. */
export function expectRelative(actual: number | undefined, expected: number, tolerance: number, what = ""): void {
  expect(actual, what).toBeTypeOf("number");
  const value = actual ?? NaN;
  const error = expected === 0 ? Math.abs(value) / 1e-12 : Math.abs(value / expected - 1) / tolerance;
  expect(error, `${what}: got ${value}, expected ${expected} within ${tolerance}`).toBeLessThanOrEqual(1);
}

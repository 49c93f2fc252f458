/** Refuses a number for which a formula has no value: its logarithm or root would not exist. */
export function requireAbove(limit: number, value: number, symbol: string): void {
  if (!(value > limit)) throw new RangeError(`${symbol} must be above ${limit}, got ${value}`);
}

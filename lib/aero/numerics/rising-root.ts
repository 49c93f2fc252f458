/**
 * Root of a function that is below zero at `low`, above at `high` and changes sign once between: halving until the
 * interval holds no further number.
 */
export function risingRoot(f: (x: number) => number, low: number, high: number): number {
  let below = low;
  let above = high;
  for (;;) {
    const middle = (below + above) / 2;
    if (middle <= below || middle >= above) return above;
    if (f(middle) < 0) below = middle;
    else above = middle;
  }
}

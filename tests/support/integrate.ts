import { Solver } from "odex";

/** y at `to` of y' = f(x, y), y(from) = start, by extrapolation to twelve digits. */
export function integrate(
  f: (x: number, y: number[]) => number[],
  from: number,
  start: number[],
  to: number,
): number[] {
  const solver = new Solver(start.length);
  solver.absoluteTolerance = 1e-12;
  solver.relativeTolerance = 1e-12;
  const { y, outcome } = solver.solve(f, from, start, to);
  if (outcome !== 0) throw new Error(`integration ended with outcome ${outcome}`);
  return y;
}

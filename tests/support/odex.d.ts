/** The part of the package that tests use; it ships no types. */
declare module "odex" {
  export class Solver {
    constructor(dimension: number);
    absoluteTolerance: number;
    relativeTolerance: number;
    solve(
      derivative: (x: number, y: number[]) => number[],
      x: number,
      y: number[],
      xEnd: number,
    ): { y: number[]; outcome: number };
  }
}

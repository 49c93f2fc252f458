/**
 * The part of the package that tests use. It ships its own sources, which our compiler options refuse; tsconfig.json
 * leads the compiler here instead.
 */
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

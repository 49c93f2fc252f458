import type { LineKind } from "@/lib/vocabulary/lines";

/** A line whose edit would have brought a problem about. */
export interface Cause {
  kind: LineKind;
  number: string;
  /** Where in the edit: "operation", "body.group". */
  path: string;
  sentence: string;
}

/**
 * What does not hold together in a budget. The causes are asked in their order: the first whose line was edited is
 * told, the others are innocent.
 */
export interface Problem {
  causes: readonly Cause[];
}

export interface ProblemOptions {
  mayOwn?: (userId: number) => boolean;
}

import type { MaturityGrade } from "@/lib/vocabulary/grades";
import type { EditOperation, LineKind } from "@/lib/vocabulary/lines";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import type { Standing } from "@/lib/vocabulary/standing";

/** One edited line as routing sees it: which fields differ from the base, and what an item's grade does. */
export interface RoutingEdit {
  operation: EditOperation;
  kind: LineKind;
  number: string;
  changedFields: readonly string[];
  gradeBefore: MaturityGrade | null;
  gradeAfter: MaturityGrade | null;
}

/** Totals at one operating point, newtons; "before" is null at a point that the change adds. */
export interface RoutingPoint {
  operatingPoint: string;
  limit: number;
  predictedBefore: number | null;
  predictedAfter: number;
  marginBefore: number | null;
  marginAfter: number;
  standingBefore: Standing | null;
  standingAfter: Standing;
}

/** What the change does to one item at one operating point by raising its grade, newtons released. */
export interface GrowthRelease {
  item: string;
  operatingPoint: string;
  released: number;
}

export interface RangeCaution {
  item: string;
  operatingPoint: string;
}

/** An approved move of an item at an operating point within the window of the rules. */
export interface EarlierMove {
  item: string;
  operatingPoint: string;
  /** The issue that the approval made: the order of the moves. */
  issue: number;
  /** Change of the predicted value, newtons. */
  predicted: number;
  released: number;
  programManagerSigned: boolean;
}

export interface RoutingFacts {
  rules: ReviewRules;
  edits: readonly RoutingEdit[];
  transfers: number;
  /** Whether the change writes a new revision of the allocations sheet. */
  movesAllocations: boolean;
  points: readonly RoutingPoint[];
  releases: readonly GrowthRelease[];
  newRangeCautions: readonly RangeCaution[];
  earlierMoves: readonly EarlierMove[];
}

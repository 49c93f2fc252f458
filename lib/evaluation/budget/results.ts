import type { Standing } from "@/lib/vocabulary/standing";
import type { MethodAnswer } from "../methods/method-answer";
import type { StreamState } from "../methods/stream-state";
import type { Note } from "../notes/note";

/** One item at one operating point. Newtons, every number rounded to 12 significant digits before it is stored. */
export interface ItemResult {
  item: string;
  operatingPoint: string;
  methodVersion: number;
  basic: number;
  growthFraction: number;
  growth: number;
  predicted: number;
  /** Everything the method gives besides; null where it is refused. */
  answer: MethodAnswer | null;
  notes: Note[];
  /** Why there is no result; the numbers are 0 then and count in no total. */
  refused: Note | null;
}

/** Newtons over all items that are not refused. */
export interface Totals {
  basic: number;
  growth: number;
  predicted: number;
  predictedWithoutSavings: number;
  /** Limit − predicted. */
  margin: number;
  /** Margin − reserve. */
  clearOfReserve: number;
}

export interface PointResult {
  operatingPoint: string;
  name: string;
  stream: StreamState;
  limitHundredths: number;
  reserveHundredths: number;
  /** In the order of the sheet. */
  items: ItemResult[];
  totals: Totals;
  standing: Standing;
}

export interface BudgetResults {
  /** The reference operating point first, the others by number. */
  points: PointResult[];
  /** The number of the operating point that stands worst. */
  worstPoint: string;
}

/** An operating point without the results of its items. */
export type PointTotals = Omit<PointResult, "items">;

import type { Span } from "./stave-layout";

export interface AllocationBarInput {
  basic: number;
  predicted: number;
  /** N; null where the row has no allocation. */
  allocation: number | null;
  /** Whether going beyond the allocation is judged here: allocations are set at the reference operating point. */
  judged: boolean;
}

export interface AllocationBarLayout {
  basic: Span;
  growth: Span;
  over: Span | null;
  post: number | null;
}

/**
 * The small bar in a table's row, as fractions of its length. The post stands at the same place in
 * every row, 100/115 of the length for an ordinary allocation, so that rows are read against one another.
 * A saving is drawn by its size; what it falls short of its promise shows as the gap to the post.
 */
export function allocationBarLayout({ basic, predicted, allocation, judged }: AllocationBarInput): AllocationBarLayout {
  const reference = allocation !== null && allocation !== 0 ? Math.abs(allocation) : null;
  const greatest = Math.max(Math.abs(basic), Math.abs(predicted));
  const length = Math.max((reference ?? greatest) * 1.15, greatest) || 1;
  const isSaving = basic < 0;
  const solid = Math.min(Math.abs(basic), isSaving ? Math.abs(predicted) : Infinity);
  const end = isSaving ? Math.abs(basic) : predicted;
  const overFrom = allocation ?? Infinity;

  return {
    basic: { from: 0, to: solid / length },
    growth: { from: solid / length, to: end / length },
    over:
      judged && !isSaving && predicted > overFrom
        ? { from: Math.max(0, overFrom) / length, to: predicted / length }
        : null,
    post: allocation === null ? null : Math.abs(allocation) / length,
  };
}

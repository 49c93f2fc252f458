import { type Scale, rulerTicks } from "./scale";

export interface StaveItem {
  number: string;
  name: string;
  /** N; a saving's is below zero. */
  basic: number;
}

export interface StaveInput {
  items: readonly StaveItem[];
  /** ΣB, ΣG and ΣP in N, as the sheet prints them. */
  basic: number;
  growth: number;
  predicted: number;
  /** N; null where no limit is set yet. */
  limit: number | null;
  reserve: number;
}

export interface Span {
  from: number;
  to: number;
}

export interface StaveSegment extends Span {
  number: string;
  name: string;
}

export interface StaveLayout {
  scale: Scale;
  segments: StaveSegment[];
  /** What savings give back: the part of the bar left of zero. */
  savings: Span | null;
  growth: Span;
  /** What lies beyond the limit. */
  over: Span | null;
  limit: number | null;
  /** Where the reserve begins. */
  reserveFrom: number | null;
  ticks: number[];
}

/**
 * The stave: every value of a total on one straight scale, in newtons; its ruler has round values of the measure in
 * which a newton is `perNewton`.
 * Contributions follow one another; the bar starts left of zero by what the savings give back,
 * so that its solid end stands at ΣB and its hatched end at ΣP on the ruler.
 */
export function staveLayout(input: StaveInput, perNewton = 1): StaveLayout {
  const savings = sum(input.items.filter(({ basic }) => basic < 0));
  const segments = segmentsFrom(savings, input.items);
  const growth = { from: input.basic, to: input.predicted };
  const { limit } = input;
  const scale = scaleFor([0, savings, input.basic, input.predicted, limit ?? 0]);

  return {
    scale,
    segments,
    savings: savings < 0 ? { from: savings, to: 0 } : null,
    growth,
    over: limit !== null && input.predicted > limit ? { from: limit, to: input.predicted } : null,
    limit,
    reserveFrom: limit !== null && input.reserve > 0 ? limit - input.reserve : null,
    ticks: rulerTicks(scale, 8, perNewton),
  };
}

function sum(items: readonly StaveItem[]): number {
  return items.reduce((total, { basic }) => total + basic, 0);
}

function segmentsFrom(start: number, items: readonly StaveItem[]): StaveSegment[] {
  let from = start;
  return items
    .filter(({ basic }) => basic > 0)
    .map(({ number, name, basic }) => {
      const segment = { number, name, from, to: from + basic };
      from = segment.to;
      return segment;
    });
}

/** The same total in another measure: every value times what a newton is there. */
export function scaledStave(input: StaveInput, perNewton: number): StaveInput {
  const { items, basic, growth, predicted, limit, reserve } = input;
  return {
    items: items.map((item) => ({ ...item, basic: item.basic * perNewton })),
    basic: basic * perNewton,
    growth: growth * perNewton,
    predicted: predicted * perNewton,
    limit: limit === null ? null : limit * perNewton,
    reserve: reserve * perNewton,
  };
}

/** From the least to a little beyond the greatest, so that the last post does not stand on the edge. */
function scaleFor(values: readonly number[]): Scale {
  const min = Math.min(...values);
  const max = Math.max(...values);
  return max > min ? { min, max: max + (max - min) * 0.06 } : { min, max: min + 1 };
}

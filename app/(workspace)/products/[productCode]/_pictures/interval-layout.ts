import { type Scale, fractionOf, rulerTicks } from "./scale";

export interface IntervalInput {
  /** ΣB with its standard uncertainty, N. */
  basic: { value: number; standardUncertainty: number; low95: number; high95: number };
  /** ΣB + ΣG. */
  predicted: { value: number; standardUncertainty: number };
  limit: number;
  /** Between what 95 % of the draws of a run lie; null before there is one. */
  drawn: { low95: number; high95: number } | null;
}

/** Fractions of the picture: x from the left, y from the ruler up. */
export interface BellPoint {
  x: number;
  y: number;
}

export interface IntervalLayout {
  scale: Scale;
  ticks: number[];
  basic: BellPoint[];
  predicted: BellPoint[];
  /** The part of ΣB + ΣG beyond the limit. */
  over: BellPoint[];
}

/** How far a bell is drawn to each side, in standard uncertainties: beyond it has no height to be seen. */
const REACH = 3.3;
const POINTS = 67;

/** Two normal distributions over one ruler, their areas alike, and the limit. */
export function intervalLayout({ basic, predicted, limit, drawn }: IntervalInput): IntervalLayout {
  const scale = scaleOf([
    basic.value - REACH * basic.standardUncertainty,
    predicted.value + REACH * predicted.standardUncertainty,
    predicted.value - REACH * predicted.standardUncertainty,
    limit,
    ...(drawn ? [drawn.low95, drawn.high95] : []),
  ]);
  const narrowest = Math.min(basic.standardUncertainty, predicted.standardUncertainty);
  const bell = ({ value, standardUncertainty }: IntervalInput["predicted"], from = -Infinity): BellPoint[] =>
    stretch(value, standardUncertainty, from).map((newtons) => ({
      x: fractionOf(scale, newtons),
      y: (narrowest / standardUncertainty) * Math.exp(-0.5 * ((newtons - value) / standardUncertainty) ** 2),
    }));
  return {
    scale,
    ticks: rulerTicks(scale, 8),
    basic: bell(basic),
    predicted: bell(predicted),
    over: bell(predicted, limit),
  };
}

/** Newtons at even distances over a bell, from its foot or from a place within it; none where it ends before that. */
function stretch(value: number, standardUncertainty: number, from: number): number[] {
  const start = Math.max(value - REACH * standardUncertainty, from);
  const end = value + REACH * standardUncertainty;
  if (start >= end) return [];
  return Array.from({ length: POINTS }, (_, index) => start + ((end - start) * index) / (POINTS - 1));
}

function scaleOf(values: readonly number[]): Scale {
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const room = (high - low) * 0.02;
  return { min: low - room, max: high + room };
}

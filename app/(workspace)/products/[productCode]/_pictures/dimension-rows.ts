import { type Scale, fractionOf } from "./scale";
import type { Span } from "./stave-layout";

export interface Dimension extends Span {
  /** The printed value: "268.00 N". */
  value: string;
  word: string;
}

export interface PlacedDimension extends Dimension {
  /** Where the label stands: on the line, right of it, or below it at one of its ends. */
  label: "on" | "right" | "below-start" | "below-end";
  /** The span is too short for arrowheads between its ends: they point inward from outside. */
  outside: boolean;
}

/** Short enough on a narrow screen that a label of a dozen letters would not fit on the line. */
const SHORT = 0.32;
const TOO_SHORT_FOR_ARROWS = 0.06;

/** Says where the labels of one row of dimension lines stand, so that none covers another at any width. */
export function placeDimensions(scale: Scale, row: readonly Dimension[]): PlacedDimension[] {
  return row.map((dimension, index) => {
    const length = Math.abs(fractionOf(scale, dimension.to) - fractionOf(scale, dimension.from));
    const isLast = index === row.length - 1;
    return { ...dimension, outside: length < TOO_SHORT_FOR_ARROWS, label: placeOf(scale, dimension, length, isLast) };
  });
}

function placeOf(scale: Scale, { from, to }: Span, length: number, isLast: boolean): PlacedDimension["label"] {
  const end = fractionOf(scale, Math.max(from, to));
  if (length >= SHORT) return "on";
  if (isLast && end <= 0.6) return "right";
  return end > 0.6 ? "below-end" : "below-start";
}

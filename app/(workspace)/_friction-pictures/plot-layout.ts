import type { AxisTick } from "./axis";

/** Fractions of the picture: x from the left, y from the bottom. */
export interface PlotPoint {
  x: number;
  y: number;
}

export interface PlotLabel extends PlotPoint {
  text: string;
  anchor: "start" | "middle" | "end";
  /** Whether it stands above or below its point. */
  side: "above" | "below";
}

export interface PlotCurve {
  name: string;
  look: "own" | "second" | "ink" | "dashed" | "dotted" | "faint";
  points: PlotPoint[];
  label: PlotLabel | null;
}

/** A stretch of the x axis with its word at the top. */
export interface PlotBand {
  from: number;
  to: number;
  word: string;
  look: "pale" | "hatched";
}

export interface PlotMark extends PlotPoint {
  text: string;
  /** Two marks in one picture are told apart by their sign and their word. */
  sign: "ring" | "square";
  /** Whether the word stands above or below the sign. */
  side: "above" | "below";
}

/** A picture with two axes, ready to be drawn at any width. */
export interface PlotLayout {
  xTicks: AxisTick[];
  yTicks: AxisTick[];
  xTitle: string;
  yTitle: string;
  bands: PlotBand[];
  curves: PlotCurve[];
  marks: PlotMark[];
}

/** Values at even distances, first and last included. */
export function evenly(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, index) => from + ((to - from) * index) / (count - 1));
}

/** Values at even ratios, first and last included. */
export function evenRatios(from: number, to: number, count: number): number[] {
  return evenly(Math.log(from), Math.log(to), count).map(Math.exp);
}

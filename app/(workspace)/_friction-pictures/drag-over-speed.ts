import type { MethodInput } from "@/lib/evaluation/document/schema";
import { NEWTONS, type Reading, readText } from "@/lib/evaluation/measures/reading";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";

import { straightAxis } from "./axis";
import { evenly, type PlotLayout } from "./plot-layout";

export interface SpeedPoint {
  /** m/s. */
  speed: number;
  /** N; null where the method refuses the item at that speed. */
  drag: number | null;
}

const LEAST_PART = 0.1;
const GREATEST_PART = 1.6;

/** The item's drag in the same fluid at slower and faster speeds, by its own method and version. */
export function dragOverSpeed(version: number, input: MethodInput, stream: StreamState, count = 46): SpeedPoint[] {
  return evenly(LEAST_PART, GREATEST_PART, count).map((part) => {
    const speed = stream.speed * part;
    const faster = { ...stream, speed, dynamicPressure: stream.dynamicPressure * part ** 2 };
    return { speed, drag: dragAt(version, input, faster) };
  });
}

export function dragAt(version: number, input: MethodInput, stream: StreamState): number | null {
  const outcome = evaluateMethod(input.method, version, input, stream);
  return outcome.outcome === "answer" ? outcome.answer.drag : null;
}

export interface SpeedCurve {
  /** Nothing where the picture has one curve alone. */
  word: "A" | "B" | null;
  points: readonly SpeedPoint[];
  own: { speed: number; drag: number };
}

/** How a force is read at a speed, and the speed itself: a force at another speed by the stream of that speed. */
export interface SpeedReading {
  at: (speed: number) => Reading;
  /** What one metre a second is on the axis, and what the axis is called. */
  speed: { perSi: number; unit: string };
}

export const READ_IN_SI: SpeedReading = { at: () => NEWTONS, speed: { perSi: 1, unit: "m/s" } };

/** One curve, or two beside each other: solid with a ring and dashed with a square. */
export function dragOverSpeedLayout(
  curves: readonly SpeedCurve[],
  { at, speed: axis }: SpeedReading = READ_IN_SI,
): PlotLayout {
  const read = ({ speed, drag }: { speed: number; drag: number }): number => drag * at(speed).perNewton;
  const answered = curves.map(({ points }) =>
    points.flatMap(({ speed, drag }) => (drag === null ? [] : [{ speed, drag }])),
  );
  const all = [...answered.flat(), ...curves.map(({ own }) => own)];
  const xAxis = straightAxis(curves.flatMap(({ points }) => points.map(({ speed }) => speed * axis.perSi)));
  const yAxis = straightAxis(all.map((point) => read(point) * 1.06));
  const place = (point: { speed: number; drag: number }) => ({
    x: xAxis.fraction(point.speed * axis.perSi),
    y: yAxis.fraction(read(point)),
  });

  return {
    xTicks: xAxis.ticks,
    yTicks: yAxis.ticks,
    xTitle: `U, ${axis.unit}`,
    yTitle: at(curves[0]?.own.speed ?? 1).unit,
    bands: [],
    curves: curves.map(({ word }, at) => ({
      name: word ? `drag of ${word}` : "drag",
      look: word === "B" ? "dashed" : "own",
      points: (answered[at] ?? []).map(place),
      label: null,
    })),
    marks: curves.map(({ word, own }) => ({
      ...place(own),
      text: `${word ? `${word} ` : ""}${readText(at(own.speed), own.drag)}`,
      sign: word === "B" ? "square" : "ring",
      side: word === "B" ? "below" : "above",
    })),
  };
}

import type { MethodInput } from "@/lib/evaluation/document/schema";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";
import { formatNewtons } from "@/lib/units/format-newtons";

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

/** One curve, or two beside each other: solid with a ring and dashed with a square. */
export function dragOverSpeedLayout(curves: readonly SpeedCurve[]): PlotLayout {
  const answered = curves.map(({ points }) =>
    points.flatMap(({ speed, drag }) => (drag === null ? [] : [{ speed, drag }])),
  );
  const all = [...answered.flat(), ...curves.map(({ own }) => own)];
  const xAxis = straightAxis(curves.flatMap(({ points }) => points.map(({ speed }) => speed)));
  const yAxis = straightAxis(all.map(({ drag }) => drag * 1.06));
  const place = ({ speed, drag }: { speed: number; drag: number }) => ({
    x: xAxis.fraction(speed),
    y: yAxis.fraction(drag),
  });

  return {
    xTicks: xAxis.ticks,
    yTicks: yAxis.ticks,
    xTitle: "U, m/s",
    yTitle: "N",
    bands: [],
    curves: curves.map(({ word }, at) => ({
      name: word ? `drag of ${word}` : "drag",
      look: word === "B" ? "dashed" : "own",
      points: (answered[at] ?? []).map(place),
      label: null,
    })),
    marks: curves.map(({ word, own }) => ({
      ...place(own),
      text: word ? `${word} ${formatNewtons(own.drag)}` : formatNewtons(own.drag),
      sign: word === "B" ? "square" : "ring",
      side: word === "B" ? "below" : "above",
    })),
  };
}

import type { TotalAtSpeed } from "@/lib/evaluation/budget/total-over-speed";
import { type Reading, readText } from "@/lib/evaluation/measures/reading";

import { straightAxis } from "@/app/(workspace)/_friction-pictures/axis";
import type { SpeedReading } from "@/app/(workspace)/_friction-pictures/drag-over-speed";
import type { PlotLayout } from "@/app/(workspace)/_friction-pictures/plot-layout";

interface OwnPoint {
  speed: number;
  predicted: number;
  /** Newtons. */
  limit: number;
}

/** ΣP and ΣB over the speed, with the limit across; the operating point is marked. */
export function totalOverSpeedLayout(
  points: readonly TotalAtSpeed[],
  own: OwnPoint,
  { at, speed: axis }: SpeedReading,
): PlotLayout {
  const read = (speed: number, newtons: number): number => newtons * at(speed).perNewton;
  const drawn = points.flatMap(({ speed, totals }) => (totals === null ? [] : [{ speed, ...totals }]));
  const speeds = points.map(({ speed }) => speed);
  const limits = speeds.map((speed) => read(speed, own.limit));
  // What a limit in newtons comes to at a crawl lies far above anything that is drawn.
  const highest = Math.max(read(own.speed, own.limit), ...drawn.map(({ speed, predicted }) => read(speed, predicted)));
  const xAxis = straightAxis(speeds.map((speed) => speed * axis.perSi));
  const yAxis = straightAxis([highest * 1.08]);
  const place = (speed: number, value: number) => ({ x: xAxis.fraction(speed * axis.perSi), y: yAxis.fraction(value) });
  const limitCurve = speeds.map((speed, index) => place(speed, limits[index] ?? 0)).filter(({ y }) => y <= 1);
  const ownReading = at(own.speed);
  return {
    xTicks: xAxis.ticks,
    yTicks: yAxis.ticks,
    xTitle: `U, ${axis.unit}`,
    yTitle: ownReading.unit,
    bands: [],
    curves: [
      {
        name: "predicted",
        look: "own",
        points: drawn.map(({ speed, predicted }) => place(speed, read(speed, predicted))),
        label: null,
      },
      {
        name: "basic",
        look: "faint",
        points: drawn.map(({ speed, basic }) => place(speed, read(speed, basic))),
        label: null,
      },
      { name: "limit", look: "ink", points: limitCurve, label: limitLabel(limitCurve, own, ownReading) },
    ],
    marks: [
      {
        ...place(own.speed, read(own.speed, own.predicted)),
        ...{ text: readText(ownReading, own.predicted), sign: "ring", side: "above" },
      },
    ],
  };
}

function limitLabel(curve: readonly { x: number; y: number }[], { limit }: OwnPoint, reading: Reading) {
  const [start, end] = [curve[0], curve.at(-1)];
  if (!start || !end) return null;
  // In some measures the same newtons are another value at each speed.
  const where = Math.abs(end.y - start.y) < 1e-9 ? "" : " at the operating point";
  const text = `limit ${readText(reading, limit)}${where}`;
  const side = end.y > start.y ? "above" : "below";
  return { ...end, text, anchor: "end", side } as const;
}

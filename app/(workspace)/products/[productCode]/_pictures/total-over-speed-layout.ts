import type { TotalAtSpeed } from "@/lib/evaluation/budget/total-over-speed";
import { formatNewtons } from "@/lib/units/format-newtons";
import { formatSignificant } from "@/lib/units/format-number";

import { straightAxis } from "@/app/(workspace)/_friction-pictures/axis";
import type { PlotLayout } from "@/app/(workspace)/_friction-pictures/plot-layout";

interface OwnPoint {
  speed: number;
  predicted: number;
  /** Newtons. */
  limit: number;
}

/** ΣP and ΣB over the speed, with the limit across; the operating point is marked. */
export function dragOverSpeedLayout(points: readonly TotalAtSpeed[], own: OwnPoint): PlotLayout {
  const drawn = answered(points);
  const greatest = Math.max(own.limit, ...drawn.map(({ predicted }) => predicted));
  const plot = plotOf(points, greatest, "N");
  return {
    ...plot.frame,
    curves: [
      {
        ...plot.curve(
          "predicted",
          "own",
          drawn.map((point) => [point.speed, point.predicted]),
        ),
        label: null,
      },
      {
        ...plot.curve(
          "basic",
          "faint",
          drawn.map((point) => [point.speed, point.basic]),
        ),
        label: null,
      },
      {
        ...plot.curve(
          "limit",
          "ink",
          [plot.from, plot.to].map((speed) => [speed, own.limit]),
        ),
        label: {
          ...plot.place(plot.to, own.limit),
          text: `limit ${formatNewtons(own.limit)}`,
          anchor: "end",
          side: "below",
        },
      },
    ],
    marks: [
      { ...plot.place(own.speed, own.predicted), text: formatNewtons(own.predicted), sign: "ring", side: "above" },
    ],
  };
}

/** Drag times speed, with what the limit allows at each speed. */
export function powerOverSpeedLayout(points: readonly TotalAtSpeed[], own: OwnPoint): PlotLayout {
  const drawn = answered(points);
  const greatest = Math.max(...points.map(({ speed }) => speed * own.limit), ...drawn.map(power));
  const plot = plotOf(points, greatest, "W");
  const ownPower = own.speed * own.predicted;
  return {
    ...plot.frame,
    curves: [
      {
        ...plot.curve(
          "power",
          "own",
          drawn.map((point) => [point.speed, power(point)]),
        ),
        label: null,
      },
      {
        ...plot.curve(
          "limit",
          "ink",
          [plot.from, plot.to].map((speed) => [speed, speed * own.limit]),
        ),
        label: {
          ...plot.place(plot.to, plot.to * own.limit),
          ...{ text: "limit × speed", anchor: "end", side: "below" },
        },
      },
    ],
    marks: [
      { ...plot.place(own.speed, ownPower), text: `${formatSignificant(ownPower)} W`, sign: "ring", side: "above" },
    ],
  };
}

interface Answered {
  speed: number;
  basic: number;
  predicted: number;
}

function answered(points: readonly TotalAtSpeed[]): Answered[] {
  return points.flatMap(({ speed, totals }) => (totals === null ? [] : [{ speed, ...totals }]));
}

function power({ speed, predicted }: Answered): number {
  return speed * predicted;
}

function plotOf(points: readonly TotalAtSpeed[], greatest: number, unit: string) {
  const speeds = points.map(({ speed }) => speed);
  const xAxis = straightAxis(speeds);
  const yAxis = straightAxis([greatest * 1.08]);
  const place = (speed: number, value: number) => ({ x: xAxis.fraction(speed), y: yAxis.fraction(value) });
  return {
    from: Math.min(...speeds),
    to: Math.max(...speeds),
    place,
    curve: <Look extends string>(name: string, look: Look, line: readonly (readonly [number, number])[]) => ({
      ...{ name, look, points: line.map(([speed, value]) => place(speed, value)) },
    }),
    frame: { xTicks: xAxis.ticks, yTicks: yAxis.ticks, xTitle: "U, m/s", yTitle: unit, bands: [] },
  };
}

import { formatSignificant } from "@/lib/units/format-number";

import { decadeAxis, powerOfTen, stepAxis } from "./axis";
import type { ChartPoint, FrictionChart } from "./friction-chart";
import type { PlotCurve, PlotLabel, PlotLayout, PlotMark, PlotPoint } from "./plot-layout";

/** Coefficients that the lines themselves need; an item beyond them widens the chart. */
const LEAST = 1e-3;
const GREATEST = 1e-2;

/** The friction chart on two logarithmic axes, with one item, or with a second one beside it: A and B then. */
export function frictionChartLayout(chart: FrictionChart, beside: FrictionChart | null = null): PlotLayout {
  const charts = beside ? [chart, beside] : [chart];
  const owns = charts.map(({ own }) => own.coefficient);
  const isFirstLower = beside !== null && chart.own.coefficient < beside.own.coefficient;
  const least = Math.min(...charts.map(({ leastReynolds }) => leastReynolds));
  const xAxis = decadeAxis(Math.round(Math.log10(least)), 10);
  const highest = Math.max(GREATEST, ...owns, ...charts.map(({ laminar }) => laminar[0]?.coefficient ?? 0));
  const yAxis = stepAxis(Math.min(LEAST, ...owns), highest);
  const place = ({ reynolds, coefficient }: ChartPoint): PlotPoint => ({
    x: xAxis.fraction(reynolds),
    y: yAxis.fraction(coefficient),
  });
  const drawn = (
    name: string,
    look: PlotCurve["look"],
    points: readonly ChartPoint[],
    label: Omit<PlotLabel, "x" | "y"> | null = null,
    labelAt?: ChartPoint,
  ): PlotCurve => ({
    name,
    look,
    points: points.map(place),
    label: label && labelAt ? { ...label, ...place(labelAt) } : null,
  });

  return {
    xTicks: xAxis.ticks,
    yTicks: yAxis.ticks,
    xTitle: "Re",
    yTitle: "C_F",
    bands: [],
    curves: [
      ...chart.family.map(({ lengthOverRoughness, points }) =>
        drawn(
          `L/k_s ${powerOfTen(Math.round(Math.log10(lengthOverRoughness)))}`,
          "faint",
          points,
          above(`L/k_s ${powerOfTen(Math.round(Math.log10(lengthOverRoughness)))}`),
          points.at(-1),
        ),
      ),
      drawn("laminar", "dashed", chart.laminar, below("laminar"), chart.laminar[4]),
      drawn("laminar beyond its range", "dotted", chart.laminarBeyond),
      drawn("mixed", "dashed", chart.mixed),
      drawn("turbulent", "ink", chart.turbulent, below("turbulent"), lastBefore(chart.turbulent, 3e8)),
      drawn("this item's layer", "own", chart.layer),
      ...(beside ? [drawn("the layer of B", "second", beside.layer)] : []),
    ],
    marks: charts.map(({ own }, at) => ({ ...place(own), ...markOf(own, at, beside !== null, isFirstLower) })),
  };
}

// Lines fall from left to right: what ends below its point stands clear of them.
const above = (text: string) => ({ text, anchor: "end" as const, side: "above" as const });
const below = (text: string) => ({ text, anchor: "end" as const, side: "below" as const });

/** Of two the lower one has its word below. */
function markOf(own: ChartPoint, at: number, isOfTwo: boolean, isFirstLower: boolean): Omit<PlotMark, "x" | "y"> {
  const word = at === 0 ? "A, " : "B, ";
  return {
    text: `${isOfTwo ? word : ""}C_F ${formatSignificant(own.coefficient)}`,
    sign: at === 0 ? "ring" : "square",
    side: isOfTwo && isFirstLower === (at === 0) ? "below" : "above",
  };
}

function lastBefore(points: readonly ChartPoint[], reynolds: number): ChartPoint | undefined {
  return points.findLast((point) => point.reynolds <= reynolds);
}

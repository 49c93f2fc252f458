import { formatResult } from "@/lib/units/format-quantity";

import { type Axis, straightAxis } from "./axis";
import type { LayerGrowth, LayerStation } from "./layer-growth";
import type { PlotBand, PlotCurve, PlotLayout } from "./plot-layout";

const MILLIMETRES = 1000;
/** The part of the layer at its start over which the shear may run off the picture. */
const STEEP_START = 0.02;

/** δ, δ* and θ in millimetres along the layer. */
export function growthLayout(growth: LayerGrowth): PlotLayout {
  const { stations } = growth;
  const xAxis = straightAxis([growth.end]);
  const yAxis = straightAxis(stations.map(({ thickness }) => thickness * MILLIMETRES * 1.08));
  const line = (
    name: string,
    look: PlotCurve["look"],
    side: "above" | "below",
    value: (station: LayerStation) => number,
  ): PlotCurve => {
    const points = stations.map((station) => ({
      x: xAxis.fraction(station.place),
      y: yAxis.fraction(value(station) * MILLIMETRES),
    }));
    const last = points.at(-1);
    return {
      name,
      look,
      points,
      label: last ? { x: 0.985, y: last.y, text: name, anchor: "end", side } : null,
    };
  };

  return {
    xTicks: xAxis.ticks,
    yTicks: yAxis.ticks,
    xTitle: "x, m",
    yTitle: "mm",
    bands: bandsOf(growth, xAxis),
    curves: [
      line("θ", "dashed", "below", (station) => station.momentumThickness),
      line("δ*", "ink", "above", (station) => station.displacementThickness),
      line("δ", "own", "above", (station) => station.thickness),
    ],
    marks: [],
  };
}

/** Wall shear stress in pascals along the layer. */
export function shearLayout(growth: LayerGrowth): PlotLayout {
  const { stations } = growth;
  const xAxis = straightAxis([growth.end]);
  const bounded = stations.filter(({ place }) => place >= growth.end * STEEP_START);
  const yAxis = straightAxis(bounded.map(({ wallShearStress }) => wallShearStress * 1.08));
  const points = stations.map((station) => ({
    x: xAxis.fraction(station.place),
    y: yAxis.fraction(station.wallShearStress),
  }));
  const last = points.at(-1);
  const atEnd = stations.at(-1);

  return {
    xTicks: xAxis.ticks,
    yTicks: yAxis.ticks,
    xTitle: "x, m",
    yTitle: "τ_w, Pa",
    bands: bandsOf(growth, xAxis),
    curves: [{ name: "τ_w", look: "own", points, label: null }],
    marks:
      last && atEnd ? [{ ...last, text: formatResult(atEnd.wallShearStress, "Pa"), sign: "ring", side: "above" }] : [],
  };
}

/** What lies ahead of the plate, and where on it the layer is laminar. */
function bandsOf({ runUp, end, transitionAt }: LayerGrowth, { fraction }: Axis): PlotBand[] {
  const laminarTo = transitionAt ?? end;
  return [
    ...(laminarTo > 0 ? [{ from: 0, to: fraction(laminarTo), word: "laminar", look: "pale" as const }] : []),
    ...(runUp > 0 ? [{ from: 0, to: fraction(runUp), word: "run-up", look: "hatched" as const }] : []),
  ];
}

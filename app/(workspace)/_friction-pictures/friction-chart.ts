import { blasiusFrictionIntegral, BLASIUS_RANGE } from "@/lib/aero/friction/blasius";
import type { FrictionLine } from "@/lib/aero/friction/friction-line";
import { frictionLayer } from "@/lib/aero/friction/friction-layer";
import { FULLY_ROUGH } from "@/lib/aero/friction/fully-rough";
import { PRANDTL_SCHLICHTING } from "@/lib/aero/friction/prandtl-schlichting";
import { DEFAULT_CRITICAL_REYNOLDS } from "@/lib/evaluation/document/method-schemas";

import { evenRatios } from "./plot-layout";
import type { FrictionSubject } from "./friction-subject";

/** L/k_s of the family of rough surfaces. */
export const ROUGHNESS_FAMILY = [1e3, 1e4, 1e5, 1e6] as const;
const GREATEST_REYNOLDS = 1e10;
const POINTS = 73;

export interface ChartPoint {
  reynolds: number;
  coefficient: number;
}

export interface FrictionChart {
  leastReynolds: number;
  /** Blasius where it is stated, and beyond. */
  laminar: ChartPoint[];
  laminarBeyond: ChartPoint[];
  mixed: ChartPoint[];
  turbulent: ChartPoint[];
  family: { lengthOverRoughness: number; points: ChartPoint[] }[];
  /** The item's own layer from its start to its end. */
  layer: ChartPoint[];
  own: ChartPoint;
  smoothLine: FrictionLine;
  roughLine: FrictionLine;
  /** Re at which the mixed line turns turbulent. */
  transitionReynolds: number;
}

/** Mean coefficients of friction over Re: what a plate can have, and where this item's is. */
export function frictionChart({ friction, setup, meanCoefficient }: FrictionSubject): FrictionChart {
  const leastReynolds = setup.endReynolds < 2e4 ? 1e3 : 1e4;
  const { smoothLine, roughLine } = linesOf(friction);
  const transitionReynolds =
    setup.askedTransition.kind === "at" ? setup.askedTransition.reynolds : DEFAULT_CRITICAL_REYNOLDS;
  const range = evenRatios(leastReynolds, GREATEST_REYNOLDS, POINTS);
  const turbulent = meanOf(frictionLayer(smoothLine, 0, { kind: "from-start" }));
  const mixed = meanOf(frictionLayer(smoothLine, 0, { kind: "at", reynolds: transitionReynolds }));
  const from = Math.min(leastReynolds, setup.endReynolds / 2);

  return {
    leastReynolds,
    laminar: curve(evenRatios(leastReynolds, BLASIUS_RANGE.max, 9), laminarMean),
    laminarBeyond: curve(evenRatios(BLASIUS_RANGE.max, GREATEST_REYNOLDS, 9), laminarMean),
    mixed: curve(evenRatios(transitionReynolds, GREATEST_REYNOLDS, POINTS), mixed),
    turbulent: curve(range, turbulent),
    family: ROUGHNESS_FAMILY.map((lengthOverRoughness) => ({
      lengthOverRoughness,
      points: curve(range, roughMean(roughLine, lengthOverRoughness)).filter(
        ({ reynolds, coefficient }) => coefficient >= turbulent(reynolds),
      ),
    })),
    layer: curve(evenRatios(from, setup.endReynolds, POINTS), meanOf(setup.layer)),
    own: { reynolds: setup.endReynolds, coefficient: meanCoefficient },
    smoothLine,
    roughLine,
    transitionReynolds,
  };
}

/** A line for rough surfaces has no smooth one and the other way round: the automatic choice's then stands in. */
function linesOf({ frictionLine: asked, lines }: FrictionSubject["friction"]): {
  smoothLine: FrictionLine;
  roughLine: FrictionLine;
} {
  const line = asked === "automatic" ? PRANDTL_SCHLICHTING : lines[asked];
  return {
    smoothLine: line.surface === "rough" ? PRANDTL_SCHLICHTING : line,
    roughLine: line.surface === "smooth" ? FULLY_ROUGH : line,
  };
}

export function laminarMean(reynolds: number): number {
  return blasiusFrictionIntegral(reynolds) / reynolds;
}

/** A plate whose length over k_s is given, whatever its Re. */
export function roughMean(line: FrictionLine, lengthOverRoughness: number): (reynolds: number) => number {
  return (reynolds) => line.turbulentLayer(reynolds / lengthOverRoughness).frictionIntegral(reynolds) / reynolds;
}

function meanOf(layer: { frictionIntegral(reynolds: number): number }): (reynolds: number) => number {
  return (reynolds) => layer.frictionIntegral(reynolds) / reynolds;
}

function curve(reynolds: readonly number[], mean: (reynolds: number) => number): ChartPoint[] {
  return reynolds.map((each) => ({ reynolds: each, coefficient: mean(each) }));
}

import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import type { MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import { formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatFixed, formatPercent } from "@/lib/units/format-number";

import type { Figure } from "@/app/(workspace)/products/[productCode]/_workings/working";
import { chanceText } from "@/app/(workspace)/products/[productCode]/_uncertainty/chance-text";

/** A figure that first order and a run both give. */
interface RunFigure {
  heading: string;
  /** The same where there is little room. */
  short: string;
  unit: string | undefined;
  /** Which working of the sheet tells of first order's. */
  figure: Figure;
  ofFirstOrder: (frozen: PointUncertainty) => number;
  ofRun: (result: MonteCarloResult) => number;
  print: (value: number) => string;
  /** A run's less first order's. */
  difference: (run: number, firstOrder: number) => string;
}

const NEWTONS = { unit: "N", print: formatNewtonsNumber };
const CHANCE = { unit: undefined, print: chanceText, difference: pointsText };

export const RUN_FIGURES: readonly RunFigure[] = [
  {
    ...NEWTONS,
    heading: "ΣB",
    short: "ΣB, N",
    figure: "basic",
    ofFirstOrder: ({ basic }) => basic.value,
    ofRun: ({ basic }) => basic.mean,
    difference: newtonsText,
  },
  {
    ...NEWTONS,
    heading: "u(ΣB)",
    short: "u(ΣB), N",
    figure: "standardUncertainty",
    ofFirstOrder: ({ basic }) => basic.standardUncertainty,
    ofRun: ({ basic }) => basic.standardDeviation,
    difference: partText,
  },
  {
    ...NEWTONS,
    heading: "95 % from",
    short: "95 % from, N",
    figure: "interval",
    ofFirstOrder: ({ basic }) => basic.low95,
    ofRun: ({ basic }) => basic.low95,
    difference: newtonsText,
  },
  {
    ...NEWTONS,
    heading: "95 % to",
    short: "95 % to, N",
    figure: "interval",
    ofFirstOrder: ({ basic }) => basic.high95,
    ofRun: ({ basic }) => basic.high95,
    difference: newtonsText,
  },
  {
    ...CHANCE,
    heading: "ΣB + ΣG over the limit",
    short: "ΣB + ΣG over",
    figure: "predictedExceedsLimit",
    ofFirstOrder: ({ predictedExceedsLimit }) => predictedExceedsLimit,
    ofRun: ({ predictedExceedsLimit }) => predictedExceedsLimit,
  },
  {
    ...CHANCE,
    heading: "ΣB over the limit",
    short: "ΣB over",
    figure: "basicExceedsLimit",
    ofFirstOrder: ({ basicExceedsLimit }) => basicExceedsLimit,
    ofRun: ({ basicExceedsLimit }) => basicExceedsLimit,
  },
];

function newtonsText(run: number, firstOrder: number): string {
  return formatNewtonsChangeNumber(run - firstOrder);
}

/** In per cent of first order's. */
function partText(run: number, firstOrder: number): string {
  return signed(run / firstOrder - 1, formatPercent(Math.abs(run / firstOrder - 1), 1));
}

/** In points of per cent. */
function pointsText(run: number, firstOrder: number): string {
  return signed(run - firstOrder, `${formatFixed(Math.abs(run - firstOrder) * 100, 1)} points`);
}

function signed(value: number, size: string): string {
  if (/^0\.0\D/.test(size)) return size;
  return value < 0 ? `−${size}` : `+${size}`;
}

import type { ReactNode } from "react";

import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatExact } from "@/lib/units/format-number";

import { DimensionLines } from "./dimension-lines";
import type { Dimension, PlacedDimension } from "./dimension-rows";
import { type BellPoint, type IntervalInput, intervalLayout } from "./interval-layout";
import { type Scale, fractionOf, percent } from "./scale";

const HEAD = 52;
const BELL = 110;
const RULER = HEAD + BELL;
const FIRST_ROW = RULER + 48;
const ROW_STEP = 38;

/** ΣB and ΣB + ΣG as they may turn out, over the ruler with the limit, and the 95 % interval as a dimension. */
export function IntervalPicture({ input }: { input: IntervalInput }) {
  const { scale, ticks, basic, predicted, over } = intervalLayout(input);
  const rows = dimensionRows(input).map((dimension) => [placed(dimension, scale)]);

  return (
    <svg
      width="100%"
      height={FIRST_ROW + ROW_STEP * (rows.length - 1) + 26}
      className="block overflow-visible"
      aria-hidden
    >
      <svg y={HEAD} width="100%" height={BELL} viewBox="0 0 1 1" preserveAspectRatio="none">
        <Bell points={basic} className="fill-water-pale stroke-water" width={2.5} />
        <Bell points={over} className="fill-signal-pale stroke-signal" width={1} closed />
        <Bell points={predicted} className="fill-none stroke-ink" width={1.5} />
      </svg>
      <Stem at={input.basic.value} scale={scale} top={HEAD - 20}>
        ΣB {formatNewtonsNumber(input.basic.value)}
      </Stem>
      <Stem at={input.predicted.value} scale={scale} top={HEAD - 6}>
        ΣB + ΣG {formatNewtonsNumber(input.predicted.value)}
      </Stem>
      <Limit at={input.limit} scale={scale} />
      <Ruler scale={scale} ticks={ticks} />
      {rows.map((row, at) => (
        <DimensionLines key={at} scale={scale} row={row} y={FIRST_ROW + ROW_STEP * at} />
      ))}
    </svg>
  );
}

function dimensionRows({ basic, drawn }: IntervalInput): Dimension[] {
  const row = (from: number, to: number, word: string): Dimension => ({
    from,
    to,
    value: `${formatNewtonsNumber(from)} to ${formatNewtons(to)}`,
    word,
  });
  return [
    row(basic.low95, basic.high95, "first order"),
    ...(drawn ? [row(drawn.low95, drawn.high95, "Monte Carlo")] : []),
  ];
}

/** Two figures and two words need the better part of a narrow picture; else they stand below the line. */
const LONG = 0.7;
const TOO_SHORT_FOR_ARROWS = 0.06;

function placed(dimension: Dimension, scale: Scale): PlacedDimension {
  const [start, end] = [fractionOf(scale, dimension.from), fractionOf(scale, dimension.to)];
  const below = start + end > 1 ? "below-end" : "below-start";
  return { ...dimension, outside: end - start < TOO_SHORT_FOR_ARROWS, label: end - start >= LONG ? "on" : below };
}

interface BellProps {
  points: readonly BellPoint[];
  className: string;
  width: number;
  /** Down to the ruler at both ends, where it does not end there by itself. */
  closed?: boolean;
}

function Bell({ points, className, width, closed = false }: BellProps) {
  const [first, last] = [points.at(0), points.at(-1)];
  if (!first || !last) return null;
  const feet = closed
    ? [
        { x: last.x, y: 0 },
        { x: first.x, y: 0 },
      ]
    : [];
  const path = [...points, ...feet].map(
    ({ x, y }, at) => `${at === 0 ? "M" : "L"}${x.toFixed(5)} ${(1 - y).toFixed(5)}`,
  );

  return <path d={path.join("")} strokeWidth={width} vectorEffect="non-scaling-stroke" className={className} />;
}

interface StemProps {
  at: number;
  scale: Scale;
  top: number;
  children: ReactNode;
}

/** A thin line from a total up to its words. */
function Stem({ at, scale, top, children }: StemProps) {
  return (
    <>
      <line
        x1={x(at, scale)}
        x2={x(at, scale)}
        y1={top - 8}
        y2={RULER}
        className="stroke-ink-2"
        strokeDasharray="2 3"
      />
      <Words at={at} scale={scale} y={top}>
        {children}
      </Words>
    </>
  );
}

function Limit({ at, scale }: { at: number; scale: Scale }) {
  return (
    <>
      <line x1={x(at, scale)} x2={x(at, scale)} y1="4" y2={RULER} strokeWidth="2" className="stroke-ink" />
      <Words at={at} scale={scale} y={13}>
        limit {formatNewtonsNumber(at)}
      </Words>
    </>
  );
}

function Words({ at, scale, y, children }: { at: number; scale: Scale; y: number; children: ReactNode }) {
  const leftOf = fractionOf(scale, at) > 0.5;
  return (
    <text
      x={x(at, scale)}
      dx={leftOf ? -6 : 6}
      y={y}
      textAnchor={leftOf ? "end" : "start"}
      strokeWidth="3"
      className="fill-ink stroke-sheet text-xs [paint-order:stroke]"
    >
      {children}
    </text>
  );
}

function Ruler({ scale, ticks }: { scale: Scale; ticks: readonly number[] }) {
  return (
    <>
      <line x1="0" x2="100%" y1={RULER} y2={RULER} className="stroke-ink" />
      {ticks.map((tick) => (
        <g key={tick}>
          <line x1={x(tick, scale)} x2={x(tick, scale)} y1={RULER} y2={RULER + 6} className="stroke-ink" />
          <text x={x(tick, scale)} y={RULER + 20} textAnchor="middle" className="fill-ink-2 text-xs">
            {formatExact(tick)}
          </text>
        </g>
      ))}
    </>
  );
}

function x(newtons: number, scale: Scale): string {
  return percent(fractionOf(scale, newtons));
}

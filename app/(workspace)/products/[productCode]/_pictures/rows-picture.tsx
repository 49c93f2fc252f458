import type { ReactNode } from "react";

import { SymbolText } from "@/app/_components/symbol-text";
import { NEWTONS, type Reading, readTick } from "@/lib/evaluation/measures/reading";

import { type Scale, fractionOf, percent } from "./scale";

export const ROW = 26;
/** Of a bar inside its row. */
export const BAR = { top: 5, height: 16 };

export interface PictureRow {
  label: string;
  /** Printed at the right. */
  figure: string;
  /** Drawn in the row, its top at 0. */
  bar: ReactNode;
}

interface RowsPictureProps {
  rows: readonly PictureRow[];
  scale: Scale;
  ticks: readonly number[];
  /** In which the ruler is read; what is drawn stays where its newtons are. */
  reading?: Reading;
}

/** Rows on one ruler: the name at the left, what is drawn to scale, the figure at the right. */
export function RowsPicture({ rows, scale, ticks, reading = NEWTONS }: RowsPictureProps) {
  const height = rows.length * ROW;

  return (
    <div
      className="grid grid-cols-[minmax(0,6.5rem)_minmax(0,1fr)_auto] gap-x-3 text-sm sm:grid-cols-[minmax(0,14rem)_minmax(0,1fr)_auto]"
      aria-hidden
    >
      <div>
        {rows.map(({ label }, at) => (
          <p key={at} className="h-[26px] truncate leading-[26px]">
            <SymbolText symbol={label} />
          </p>
        ))}
      </div>
      <svg width="100%" height={height + 22} className="block overflow-visible">
        {ticks.map((tick) => (
          <g key={tick}>
            <line x1={at(scale, tick)} x2={at(scale, tick)} y1="0" y2={height} className="stroke-rule" />
            <text x={at(scale, tick)} y={height + 16} textAnchor="middle" className="fill-ink-2 text-2xs">
              {readTick(reading, tick)}
            </text>
          </g>
        ))}
        {rows.map(({ bar }, index) => (
          <svg key={index} y={index * ROW} width="100%" height={ROW} className="overflow-visible">
            {bar}
          </svg>
        ))}
        <line x1="0" x2="100%" y1={height} y2={height} className="stroke-ink" />
      </svg>
      <div className="text-right whitespace-nowrap">
        {rows.map(({ figure }, at) => (
          <p key={at} className="h-[26px] leading-[26px]">
            {figure}
          </p>
        ))}
      </div>
    </div>
  );
}

/** Where a value stands, in per cent of the picture's length. */
export function at(scale: Scale, value: number): string {
  return percent(fractionOf(scale, value));
}

/** How long a stretch is drawn. */
export function lengthOf(scale: Scale, from: number, to: number): string {
  return percent(Math.abs(fractionOf(scale, to) - fractionOf(scale, from)));
}

import { useId } from "react";

import { type Reading, readNumber } from "@/lib/evaluation/measures/reading";

import { type AllocationRow, type AllocationsLayout } from "./allocations-layout";
import { at, BAR, lengthOf, ROW, RowsPicture } from "./rows-picture";
import type { Scale } from "./scale";
import { Hatches } from "./stave";
import type { Span } from "./stave-layout";

interface AllocationsPictureProps {
  layout: AllocationsLayout;
  reading: Reading;
}

/** Items against their allocations on one ruler, the margin at the right. */
export function AllocationsPicture({ layout: { rows, scale, ticks }, reading }: AllocationsPictureProps) {
  const id = useId();
  const drawn = rows.map((row) => ({
    label: row.label,
    figure: row.margin === null ? "–" : readNumber(reading, row.margin),
    bar: <Bar row={row} scale={scale} id={id} />,
  }));

  return (
    <>
      <svg width="0" height="0" className="absolute">
        <Hatches id={id} />
      </svg>
      <RowsPicture rows={drawn} scale={scale} ticks={ticks} reading={reading} />
    </>
  );
}

function Bar({
  row: { solid, growth, over, allocation },
  scale,
  id,
}: {
  row: AllocationRow;
  scale: Scale;
  id: string;
}) {
  return (
    <>
      <Stretch span={solid} scale={scale} className="fill-water" />
      <Stretch span={growth} scale={scale} fill={`url(#${id}-growth)`} />
      {over ? <Stretch span={over} scale={scale} fill={`url(#${id}-over)`} className="stroke-signal" /> : null}
      {allocation === null ? null : (
        <line
          x1={at(scale, allocation)}
          x2={at(scale, allocation)}
          y1="1"
          y2={ROW - 1}
          strokeWidth="2"
          className="stroke-ink"
        />
      )}
    </>
  );
}

function Stretch({ span, scale, ...paint }: { span: Span; scale: Scale; className?: string; fill?: string }) {
  return (
    <rect
      x={at(scale, span.from)}
      y={BAR.top}
      width={lengthOf(scale, span.from, span.to)}
      height={BAR.height}
      {...paint}
    />
  );
}

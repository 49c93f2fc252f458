import { formatNewtons, formatNewtonsChange } from "@/lib/units/format-newtons";

import { type BridgeBar, type BridgeLayout } from "./bridge-layout";
import { at, BAR, lengthOf, ROW, RowsPicture } from "./rows-picture";
import type { Scale } from "./scale";

/** From one issue's total to another's, one row per step; a thin line leads from where a step ends to the next. */
export function BridgePicture({ layout: { bars, scale, ticks } }: { layout: BridgeLayout }) {
  const rows = bars.map((bar, index) => ({
    label: bar.label,
    figure: bar.kind === "total" ? formatNewtons(bar.to) : formatNewtonsChange(bar.to - bar.from),
    bar: <Bar bar={bar} scale={scale} isLast={index === bars.length - 1} />,
  }));

  return <RowsPicture rows={rows} scale={scale} ticks={ticks} />;
}

const PAINT: Record<BridgeBar["kind"], string> = {
  total: "fill-water",
  rise: "fill-ink",
  fall: "fill-sheet stroke-ink",
};

function Bar({ bar: { from, to, kind }, scale, isLast }: { bar: BridgeBar; scale: Scale; isLast: boolean }) {
  const start = at(scale, Math.min(from, to));
  const end = at(scale, to);

  return (
    <>
      <rect x={start} y={BAR.top} width={lengthOf(scale, from, to)} height={BAR.height} className={PAINT[kind]} />
      {from === to ? (
        <line x1={end} x2={end} y1={BAR.top} y2={BAR.top + BAR.height} strokeWidth="2" className="stroke-ink" />
      ) : null}
      {isLast ? null : <line x1={end} x2={end} y1={BAR.top + BAR.height} y2={ROW + BAR.top} className="stroke-ink-2" />}
    </>
  );
}

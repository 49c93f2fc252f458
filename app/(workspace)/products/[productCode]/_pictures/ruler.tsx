import { type Reading, readTick } from "@/lib/evaluation/measures/reading";

import { fractionOf, percent } from "./scale";
import type { StaveLayout } from "./stave-layout";

interface RulerProps {
  layout: StaveLayout;
  /** px from the top of the picture. */
  y: number;
  reading: Reading;
}

/** The ruler under a stave, with round values of the measure that is read. */
export function Ruler({ layout: { scale, ticks }, y, reading }: RulerProps) {
  return (
    <>
      <line x1="0" x2="100%" y1={y} y2={y} className="stroke-ink" />
      {ticks.map((tick, at) => {
        const x = percent(fractionOf(scale, tick));
        const anchor = at === 0 && fractionOf(scale, tick) < 0.01 ? "start" : "middle";
        return (
          <g key={tick}>
            <line x1={x} x2={x} y1={y} y2={y + 6} className="stroke-ink" data-part="tick" data-at={tick} />
            <text x={x} y={y + 20} textAnchor={anchor} className="fill-ink-2 text-xs">
              {readTick(reading, tick)}
            </text>
          </g>
        );
      })}
    </>
  );
}

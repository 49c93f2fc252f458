import { formatExact } from "@/lib/units/format-number";
import { formatNewtons, formatNewtonsChange } from "@/lib/units/format-newtons";

import { type BridgeBar, type BridgeLayout } from "./bridge-layout";
import { fractionOf, percent } from "./scale";

const ROW = 26;

/** From one issue's total to another's, one row per item that moved. */
export function BridgePicture({ layout }: { layout: BridgeLayout }) {
  const { bars, scale, ticks } = layout;
  const height = bars.length * ROW;

  return (
    <div className="grid grid-cols-[minmax(0,8rem)_minmax(0,1fr)_5.5rem] gap-x-3 text-sm" aria-hidden>
      <div>
        {bars.map((bar, at) => (
          <p key={at} className="h-[26px] truncate leading-[26px]">
            {bar.label}
          </p>
        ))}
      </div>
      <svg width="100%" height={height + 22} className="block overflow-visible">
        {ticks.map((tick) => (
          <g key={tick}>
            <line x1={x(tick)} x2={x(tick)} y1="0" y2={height} className="stroke-rule" />
            <text x={x(tick)} y={height + 16} textAnchor="middle" className="fill-ink-2 text-2xs">
              {formatExact(tick)}
            </text>
          </g>
        ))}
        {bars.map((bar, at) => (
          <Bar key={at} bar={bar} y={at * ROW + 5} start={x(Math.min(bar.from, bar.to))} width={widthOf(bar)} />
        ))}
        <line x1="0" x2="100%" y1={height} y2={height} className="stroke-ink" />
      </svg>
      <div className="text-right">
        {bars.map((bar, at) => (
          <p key={at} className="h-[26px] leading-[26px]">
            {bar.kind === "total" ? formatNewtons(bar.to) : formatNewtonsChange(bar.to - bar.from)}
          </p>
        ))}
      </div>
    </div>
  );

  function x(value: number): string {
    return percent(fractionOf(scale, value));
  }

  function widthOf({ from, to }: BridgeBar): string {
    return percent(Math.abs(fractionOf(scale, to) - fractionOf(scale, from)));
  }
}

const PAINT: Record<BridgeBar["kind"], string> = {
  total: "fill-water",
  rise: "fill-ink",
  fall: "fill-sheet stroke-ink",
};

function Bar({ bar, y, start, width }: { bar: BridgeBar; y: number; start: string; width: string }) {
  return <rect x={start} y={y} width={width} height={ROW - 10} className={PAINT[bar.kind]} />;
}

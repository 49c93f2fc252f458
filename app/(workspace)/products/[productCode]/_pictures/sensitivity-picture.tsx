import { type Reading, readChangeNumber } from "@/lib/evaluation/measures/reading";

import { at, BAR, lengthOf, ROW, RowsPicture } from "./rows-picture";
import { type Scale, rulerTicks } from "./scale";

export interface SensitivityBar {
  label: string;
  /** Newtons; null where an item is refused there. */
  lower: number | null;
  higher: number | null;
}

/** What moves the total most stands on top: solid to where one step more takes it, hollow to where one step less does. */
export function SensitivityPicture({ bars, reading }: { bars: readonly SensitivityBar[]; reading: Reading }) {
  const greatest = Math.max(
    0.01,
    ...bars.flatMap(({ lower, higher }) => [Math.abs(lower ?? 0), Math.abs(higher ?? 0)]),
  );
  const scale: Scale = { min: -greatest * 1.05, max: greatest * 1.05 };
  const rows = bars.map((bar) => ({
    label: bar.label,
    figure: `${changeText(bar.lower, reading)} | ${changeText(bar.higher, reading)}`,
    bar: <Bar bar={bar} scale={scale} />,
  }));

  return <RowsPicture rows={rows} scale={scale} ticks={rulerTicks(scale, 6, reading.perNewton)} reading={reading} />;
}

export function changeText(newtons: number | null, reading: Reading): string {
  return newtons === null ? "refused" : readChangeNumber(reading, newtons);
}

function Bar({ bar: { lower, higher }, scale }: { bar: SensitivityBar; scale: Scale }) {
  const zero = at(scale, 0);

  return (
    <>
      {lower === null ? null : <Stretch to={lower} scale={scale} className="fill-sheet stroke-ink" />}
      {higher === null ? null : <Stretch to={higher} scale={scale} className="fill-ink stroke-ink" />}
      <line x1={zero} x2={zero} y1="0" y2={ROW} strokeWidth="2" className="stroke-ink" />
    </>
  );
}

function Stretch({ to, scale, className }: { to: number; scale: Scale; className: string }) {
  return (
    <rect
      x={at(scale, Math.min(0, to))}
      y={BAR.top}
      width={lengthOf(scale, 0, to)}
      height={BAR.height}
      className={className}
    />
  );
}

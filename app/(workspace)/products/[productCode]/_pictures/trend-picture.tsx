import { NEWTONS, type Reading, readTick } from "@/lib/evaluation/measures/reading";

import { percent } from "./scale";
import { type PlannedPoint, type TrendIssue, type TrendLayout, type TrendPoint, trendLayout } from "./trend-layout";

interface TrendPictureProps {
  issues: readonly TrendIssue[];
  planned: readonly PlannedPoint[];
  /** ISO time up to which the newest issue is drawn. */
  until: string;
  reading?: Reading;
}

const HEIGHT = 240;
const FOOT = 24;

/** Predicted and basic totals over the issues, with limit, reserve and the planned profile. */
export function TrendPicture({ issues, planned, until, reading = NEWTONS }: TrendPictureProps) {
  const layout = trendLayout(issues, planned, until, reading.perNewton);

  return (
    <div className="grid grid-cols-[3rem_minmax(0,1fr)]" aria-hidden>
      <svg width="100%" height={HEIGHT + FOOT} className="block overflow-visible">
        {layout.ticks.map((tick) => (
          <text key={tick.value} x="100%" dx="-8" y={y(tick.y) + 4} textAnchor="end" className="fill-ink-2 text-2xs">
            {readTick(reading, tick.value)}
          </text>
        ))}
      </svg>
      <TrendLines layout={layout} />
    </div>
  );
}

function y(fraction: number): number {
  return (1 - fraction) * HEIGHT;
}

function TrendLines({ layout }: { layout: TrendLayout }) {
  return (
    <svg width="100%" height={HEIGHT + FOOT} className="block overflow-visible">
      {layout.ticks.map((tick) => (
        <line key={tick.value} x1="0" x2="100%" y1={y(tick.y)} y2={y(tick.y)} className="stroke-rule" />
      ))}
      <svg width="100%" height={HEIGHT} viewBox="0 0 1 1" preserveAspectRatio="none" className="overflow-visible">
        <path d={pathOf(layout.plannedBand, true)} className="fill-water-pale" />
        <Line points={layout.planned} className="stroke-water" dash="2 4" />
        <Line points={layout.basic} className="stroke-ink-2" />
        <Line points={layout.reserve} className="stroke-ink" dash="5 4" />
        <Line points={layout.limit} className="stroke-ink" width={2} />
        <Line points={layout.predicted} className="stroke-water" width={2.5} />
      </svg>
      {layout.marks.map((mark) => (
        <g key={mark.issue}>
          <circle cx={percent(mark.x)} cy={y(mark.y)} r="3.5" className="fill-sheet stroke-water" strokeWidth="2" />
          {mark.labelled ? (
            <text
              x={percent(mark.x)}
              y={y(mark.y) - 8}
              textAnchor={anchorAt(mark.x)}
              strokeWidth="3"
              strokeLinejoin="round"
              className="fill-ink stroke-sheet text-2xs [paint-order:stroke]"
            >
              {mark.issue}
            </text>
          ) : null}
        </g>
      ))}
      {layout.dates.map((date) => (
        <text
          key={date.label}
          x={percent(date.x)}
          y={HEIGHT + 18}
          textAnchor={anchorAt(date.x)}
          className="fill-ink-2 text-2xs"
        >
          {date.label}
        </text>
      ))}
      <line x1="0" x2="100%" y1={HEIGHT} y2={HEIGHT} className="stroke-ink" />
    </svg>
  );
}

function anchorAt(x: number): "start" | "middle" | "end" {
  if (x < 0.06) return "start";
  return x > 0.94 ? "end" : "middle";
}

interface LineProps {
  points: readonly TrendPoint[];
  className: string;
  width?: number;
  dash?: string;
}

function Line({ points, className, width = 1.5, dash }: LineProps) {
  return (
    <path
      d={pathOf(points, false)}
      fill="none"
      strokeWidth={width}
      strokeDasharray={dash}
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}

function pathOf(points: readonly TrendPoint[], closed: boolean): string {
  const steps = points.map(({ x, y }, at) => `${at === 0 ? "M" : "L"}${x.toFixed(5)} ${(1 - y).toFixed(5)}`);
  return steps.length > 0 && closed ? `${steps.join("")}Z` : steps.join("");
}

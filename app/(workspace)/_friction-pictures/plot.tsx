import { useId } from "react";

import { percent } from "../products/[productCode]/_pictures/scale";
import type { PlotBand, PlotCurve, PlotLabel, PlotLayout, PlotMark, PlotPoint } from "./plot-layout";

const HEIGHT = 250;
/** Room above for words, below for the numbers of the x axis and what they are. */
const HEAD = 20;
const FOOT = 34;

const LOOKS: Record<PlotCurve["look"], { className: string; width: number; dash?: string }> = {
  own: { className: "stroke-water", width: 2.5 },
  second: { className: "stroke-water", width: 1.5 },
  ink: { className: "stroke-ink", width: 1.5 },
  dashed: { className: "stroke-ink", width: 1.25, dash: "6 4" },
  dotted: { className: "stroke-ink-2", width: 1.25, dash: "1 4" },
  faint: { className: "stroke-ink-2", width: 1 },
};

/** A picture with two axes; its words and strokes keep their size at any width. */
export function Plot({ layout }: { layout: PlotLayout }) {
  return (
    <div className="grid grid-cols-[2.75rem_minmax(0,1fr)]" aria-hidden>
      <svg width="100%" height={HEAD + HEIGHT + FOOT} className="block overflow-visible">
        <text x="100%" dx="-8" y={HEAD - 9} textAnchor="end" className="fill-ink-2 text-2xs">
          <Subscripted text={layout.yTitle} />
        </text>
        {layout.yTicks.map((tick) => (
          <text key={tick.at} x="100%" dx="-8" y={y(tick.at) + 4} textAnchor="end" className="fill-ink-2 text-2xs">
            {tick.label}
          </text>
        ))}
      </svg>
      <svg width="100%" height={HEAD + HEIGHT + FOOT} className="block overflow-visible">
        <Bands bands={layout.bands} />
        <Rules layout={layout} />
        <svg y={HEAD} width="100%" height={HEIGHT} viewBox="0 0 1 1" preserveAspectRatio="none">
          {layout.curves.map((curve) => (
            <Curve key={curve.name} curve={curve} />
          ))}
        </svg>
        {layout.curves.map(({ name, label }) => (label ? <Label key={name} label={label} /> : null))}
        {layout.marks.map((mark) => (
          <Mark key={mark.text} mark={mark} />
        ))}
      </svg>
    </div>
  );
}

function y(fraction: number): number {
  return HEAD + (1 - fraction) * HEIGHT;
}

function Rules({ layout: { xTicks, yTicks, xTitle } }: { layout: PlotLayout }) {
  return (
    <>
      {yTicks.map((tick) => (
        <line key={tick.at} x1="0" x2="100%" y1={y(tick.at)} y2={y(tick.at)} className="stroke-rule" />
      ))}
      {xTicks.map((tick) => (
        <g key={tick.at}>
          <line x1={percent(tick.at)} x2={percent(tick.at)} y1={y(1)} y2={y(0)} className="stroke-rule" />
          <text
            x={percent(tick.at)}
            y={HEAD + HEIGHT + 16}
            textAnchor={tick.at < 0.03 ? "start" : tick.at > 0.97 ? "end" : "middle"}
            className="fill-ink-2 text-2xs"
          >
            {tick.label}
          </text>
        </g>
      ))}
      <text x="100%" y={HEAD + HEIGHT + 31} textAnchor="end" className="fill-ink-2 text-2xs">
        {xTitle}
      </text>
      <line x1="0" x2="100%" y1={y(0)} y2={y(0)} className="stroke-ink" />
      <line x1="0" x2="0" y1={y(1)} y2={y(0)} className="stroke-ink" />
    </>
  );
}

/** Stretches of the x axis: pale where the layer is laminar, hatched where another surface lies ahead. */
function Bands({ bands }: { bands: readonly PlotBand[] }) {
  const id = useId();

  return (
    <>
      <defs>
        <pattern id={id} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <line x1="1" x2="1" y1="0" y2="7" className="stroke-rule-strong" />
        </pattern>
      </defs>
      {bands.map(({ from, to, word, look }, at) => (
        <g key={word}>
          <rect
            x={percent(from)}
            width={percent(to - from)}
            y={y(1)}
            height={HEIGHT}
            fill={look === "hatched" ? `url(#${id})` : undefined}
            className={look === "pale" ? "fill-water-pale" : undefined}
          />
          <line x1={percent(to)} x2={percent(to)} y1={y(1)} y2={y(0)} strokeDasharray="5 4" className="stroke-ink" />
          <text x={percent(from)} dx="4" y={HEAD - 7 + at * 20} className="fill-ink text-2xs">
            {word}
          </text>
        </g>
      ))}
    </>
  );
}

function Curve({ curve: { look, points } }: { curve: PlotCurve }) {
  const { className, width, dash } = LOOKS[look];

  return (
    <path
      d={pathOf(points)}
      fill="none"
      strokeWidth={width}
      strokeDasharray={dash}
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}

function pathOf(points: readonly PlotPoint[]): string {
  return points.map((point, at) => `${at === 0 ? "M" : "L"}${point.x.toFixed(5)} ${(1 - point.y).toFixed(5)}`).join("");
}

const HALO = "stroke-sheet [paint-order:stroke]";

function Label({ label }: { label: PlotLabel }) {
  return (
    <text
      x={percent(label.x)}
      y={y(label.y) + (label.side === "above" ? -5 : 14)}
      textAnchor={label.anchor}
      strokeWidth="3"
      strokeLinejoin="round"
      className={`fill-ink-2 text-2xs ${HALO}`}
    >
      <Subscripted text={label.text} />
    </text>
  );
}

/** An item's point with its value, on the side that has room. */
function Mark({ mark }: { mark: PlotMark }) {
  const onLeft = mark.x > 0.6;

  return (
    <g>
      {mark.sign === "ring" ? (
        <circle cx={percent(mark.x)} cy={y(mark.y)} r="4.5" strokeWidth="2.5" className="fill-sheet stroke-water" />
      ) : (
        <svg x={percent(mark.x)} y={y(mark.y)} className="overflow-visible">
          <rect x="-4.5" y="-4.5" width="9" height="9" strokeWidth="2" className="fill-sheet stroke-ink" />
        </svg>
      )}
      <text
        x={percent(mark.x)}
        dx={onLeft ? -9 : 9}
        y={y(mark.y) + (mark.side === "above" ? -9 : 19)}
        textAnchor={onLeft ? "end" : "start"}
        strokeWidth="4"
        strokeLinejoin="round"
        className={`fill-ink text-sm font-semibold ${HALO}`}
      >
        <Subscripted text={mark.text} />
      </text>
    </g>
  );
}

/** A symbol as it is printed: the letters after "_" stand below the line. */
function Subscripted({ text }: { text: string }) {
  const parts = text.split(/_([A-Za-z]+)/);

  return parts.map((part, at) =>
    at % 2 === 1 ? (
      <tspan key={at}>
        <tspan dy="3" fontSize="0.75em">
          {part}
        </tspan>
        <tspan dy="-3">&#8203;</tspan>
      </tspan>
    ) : (
      part
    ),
  );
}

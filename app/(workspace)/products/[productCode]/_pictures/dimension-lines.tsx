import type { PlacedDimension } from "./dimension-rows";
import { type Scale, fractionOf, percent } from "./scale";

interface DimensionLinesProps {
  scale: Scale;
  row: readonly PlacedDimension[];
  /** px from the top of the picture to the line. */
  y: number;
}

/** A row of dimension lines as on a drawing: end strokes, arrowheads, the figure on the line or beside it. */
export function DimensionLines({ scale, row, y }: DimensionLinesProps) {
  return row.map((dimension) => {
    const start = percent(fractionOf(scale, Math.min(dimension.from, dimension.to)));
    const end = percent(fractionOf(scale, Math.max(dimension.from, dimension.to)));
    return (
      <g key={dimension.word} data-dimension={dimension.word} data-from={dimension.from} data-to={dimension.to}>
        <line x1={start} x2={end} y1={y} y2={y} className="stroke-ink" />
        {[start, end].map((x, at) => (
          <line key={at} x1={x} x2={x} y1={y - 7} y2={y + 7} className="stroke-ink" />
        ))}
        <Arrowhead x={start} y={y} points={dimension.outside ? "right" : "left"} />
        <Arrowhead x={end} y={y} points={dimension.outside ? "left" : "right"} />
        <DimensionLabel dimension={dimension} start={start} end={end} scale={scale} y={y} />
      </g>
    );
  });
}

/** The tip stands at x; a tip that points right has its body on the left. */
function Arrowhead({ x, y, points }: { x: string; y: number; points: "left" | "right" }) {
  const back = points === "right" ? -7 : 7;
  return (
    <svg x={x} y={y} className="overflow-visible">
      <path d={`M0 0L${back} -3V3Z`} className="fill-ink" />
    </svg>
  );
}

interface DimensionLabelProps {
  dimension: PlacedDimension;
  start: string;
  end: string;
  scale: Scale;
  y: number;
}

function DimensionLabel({ dimension, start, end, scale, y }: DimensionLabelProps) {
  const middle = percent(fractionOf(scale, (dimension.from + dimension.to) / 2));
  const place = {
    on: { x: middle, anchor: "middle", dx: 0, dy: 4.5 },
    right: { x: end, anchor: "start", dx: 12, dy: 4.5 },
    "below-start": { x: start, anchor: "start", dx: 0, dy: 20 },
    "below-end": { x: end, anchor: "end", dx: 0, dy: 20 },
  } as const;
  const { x, anchor, dx, dy } = place[dimension.label];

  return (
    <text
      x={x}
      y={y + dy}
      dx={dx}
      textAnchor={anchor}
      strokeWidth={dimension.label === "on" ? 12 : 4}
      strokeLinejoin="round"
      className="fill-ink stroke-sheet text-sm font-semibold [paint-order:stroke]"
    >
      {dimension.value}
      <tspan dx="4" className="fill-ink-2 font-normal">
        {dimension.word}
      </tspan>
    </text>
  );
}

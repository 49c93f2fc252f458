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

  const words = { x, y: y + dy, dx, textAnchor: anchor };

  return (
    <g className="text-sm font-semibold">
      <text
        {...words}
        strokeWidth={dimension.label === "on" ? 12 : 4}
        strokeLinejoin="round"
        className="fill-sheet stroke-sheet"
      >
        <DimensionWords dimension={dimension} />
      </text>
      <text {...words} className="fill-ink">
        <DimensionWords dimension={dimension} />
      </text>
    </g>
  );
}

/** Drawn twice: once as the gap in the line, then the words themselves, so that neither eats the other. */
function DimensionWords({ dimension: { value, word } }: { dimension: PlacedDimension }) {
  return (
    <>
      {value}
      <tspan dx="4" className="font-normal">
        {word}
      </tspan>
    </>
  );
}

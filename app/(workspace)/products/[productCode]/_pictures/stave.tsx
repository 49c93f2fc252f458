import { type ReactNode, useId } from "react";

import { formatExact } from "@/lib/units/format-number";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { DimensionLines } from "./dimension-lines";
import { type Dimension, placeDimensions } from "./dimension-rows";
import { type Scale, fractionOf, percent } from "./scale";
import { type Span, type StaveInput, type StaveLayout, type StaveSegment, staveLayout } from "./stave-layout";

const BAR = { top: 36, height: 38 };
const RULER = 86;
const FIRST_ROW = 134;
const ROW_STEP = 38;

/** One total to scale: items solid in order, growth hatched at their end, posts for limit and reserve, a ruler, dimensions. */
export function Stave({ input }: { input: StaveInput }) {
  const layout = staveLayout(input);
  const rows = dimensionRows(input)
    .map((row) =>
      placeDimensions(
        layout.scale,
        row.filter(({ from, to }) => from !== to),
      ),
    )
    .filter((row) => row.length > 0);
  const { scale } = layout;

  return (
    <svg
      width="100%"
      height={FIRST_ROW + ROW_STEP * (rows.length - 1) + 26}
      data-stave
      data-scale-min={scale.min}
      data-scale-max={scale.max}
      className="block overflow-visible"
      aria-hidden
    >
      <StaveBar layout={layout} top={BAR.top} height={BAR.height} named />
      <Posts layout={layout} top={4} foot={RULER} labelled />
      <Ruler layout={layout} y={RULER} />
      {rows.map((row, at) => (
        <DimensionLines key={at} scale={scale} row={row} y={FIRST_ROW + ROW_STEP * at} />
      ))}
    </svg>
  );
}

function dimensionRows({ basic, growth, predicted, limit }: StaveInput): Dimension[][] {
  const built = [
    { from: 0, to: basic, value: formatNewtons(basic), word: "basic" },
    { from: basic, to: predicted, value: formatNewtonsNumber(growth), word: "growth" },
  ];
  const total = { from: 0, to: predicted, value: formatNewtons(predicted), word: "predicted" };
  if (limit === null) return [built, [total]];

  const distance = formatNewtonsNumber(Math.abs(limit - predicted));
  if (predicted > limit) return [built, [total], [{ from: limit, to: predicted, value: distance, word: "over" }]];
  return [built, [total, { from: predicted, to: limit, value: distance, word: "to limit" }]];
}

interface StaveBarProps {
  layout: StaveLayout;
  /** The scale to draw to, where several staves stand above one another. */
  scale?: Scale;
  top: number;
  height: number;
  named?: boolean;
}

/** The bar of a stave: solid, hatched, and what lies beyond the limit. */
export function StaveBar({ layout, scale = layout.scale, top, height, named = false }: StaveBarProps) {
  const id = useId();
  const { growth, over, savings } = layout;

  return (
    <>
      <Hatches id={id} />
      {layout.segments.map((segment) => (
        <Segment key={segment.number} span={segment} scale={scale} top={top} height={height}>
          <rect
            width="100%"
            height={height}
            className="fill-water"
            data-part="item"
            data-number={segment.number}
            data-from={segment.from}
            data-to={segment.to}
          />
          {named ? <SegmentName segment={segment} scale={scale} /> : null}
          <rect x="100%" width="4" height={height} transform="translate(-1.5)" className="fill-sheet" />
        </Segment>
      ))}
      {savings ? <Hollow span={savings} scale={scale} top={top} height={height} named={named} /> : null}
      <Part span={growth} scale={scale} top={top} height={height} part="growth" fill={`url(#${id}-growth)`} />
      {over ? <Part span={over} scale={scale} top={top} height={height} part="over" fill={`url(#${id}-over)`} /> : null}
    </>
  );
}

/** Left of zero the savings lie over a segment: its name stands in the part that counts. */
function SegmentName({ segment: { from, to, name }, scale }: { segment: StaveSegment; scale: Scale }) {
  const start = Math.max(from, Math.min(0, to));
  if (fractionOf(scale, to) - fractionOf(scale, start) <= 0.05) return null;

  return (
    <text x={percent((start - from) / (to - from))} dx="6" y="16" className="fill-sheet text-xs">
      {name}
    </text>
  );
}

interface BandProps {
  span: Span;
  scale: Scale;
  top: number;
  height: number;
}

function Segment({ span, scale, top, height, children }: BandProps & { children: ReactNode }) {
  const { x, width } = place(span, scale);
  return (
    <svg x={x} y={top} width={width} height={height} className="overflow-hidden">
      {children}
    </svg>
  );
}

function Part({ span, scale, top, height, part, fill }: BandProps & { part: string; fill: string }) {
  const { x, width } = place(span, scale);
  return (
    <rect
      x={x}
      y={top}
      width={width}
      height={height}
      fill={fill}
      className={part === "over" ? "stroke-signal" : undefined}
      data-part={part}
      data-from={span.from}
      data-to={span.to}
    />
  );
}

/** What savings give back stands left of zero, hollowed: it counts in no total. */
function Hollow({ span, scale, top, height, named }: BandProps & { named: boolean }) {
  return (
    <Segment span={span} scale={scale} top={top} height={height}>
      <rect
        width="100%"
        height={height}
        strokeDasharray="3 3"
        strokeWidth="2"
        fillOpacity="0.82"
        className="fill-sheet stroke-water"
        data-part="savings"
        data-from={span.from}
        data-to={span.to}
      />
      {named && fractionOf(scale, span.to) - fractionOf(scale, span.from) > 0.12 ? (
        <text x="6" y={height - 8} className="fill-ink text-xs">
          savings {formatNewtonsNumber(span.from)}
        </text>
      ) : null}
    </Segment>
  );
}

function place({ from, to }: Span, scale: Scale): { x: string; width: string } {
  const start = fractionOf(scale, Math.min(from, to));
  const end = fractionOf(scale, Math.max(from, to));
  return { x: percent(start), width: percent(end - start) };
}

/** Drawn, not coloured: the hatch is what says growth and over. */
export function Hatches({ id }: { id: string }) {
  return (
    <defs>
      {[
        { name: "growth", ground: "fill-water-pale", line: "stroke-water" },
        { name: "over", ground: "fill-signal-pale", line: "stroke-signal" },
      ].map(({ name, ground, line }) => (
        <pattern
          key={name}
          id={`${id}-${name}`}
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform={name === "growth" ? "rotate(45)" : "rotate(-45)"}
        >
          <rect width="6" height="6" className={ground} />
          <line x1="1" x2="1" y1="0" y2="6" strokeWidth="2" className={line} />
        </pattern>
      ))}
    </defs>
  );
}

interface PostsProps {
  layout: StaveLayout;
  scale?: Scale;
  top: number;
  foot: number;
  labelled?: boolean;
}

/** The limit solid, the reserve dashed, both in ink. Their labels stand on two lines, so that they never meet. */
export function Posts({ layout: { limit, reserveFrom, scale: own }, scale = own, top, foot, labelled }: PostsProps) {
  return (
    <>
      {reserveFrom === null ? null : (
        <Post at={reserveFrom} scale={scale} top={labelled ? top + 16 : top} foot={foot} part="reserve">
          {labelled ? `reserve from ${formatNewtonsNumber(reserveFrom)}` : null}
        </Post>
      )}
      {limit === null ? null : (
        <Post at={limit} scale={scale} top={top} foot={foot} part="limit">
          {labelled ? `limit ${formatNewtonsNumber(limit)}` : null}
        </Post>
      )}
    </>
  );
}

interface PostProps {
  at: number;
  scale: Scale;
  top: number;
  foot: number;
  part: "limit" | "reserve";
  children: ReactNode;
}

function Post({ at, scale, top, foot, part, children }: PostProps) {
  const x = percent(fractionOf(scale, at));
  const leftOf = fractionOf(scale, at) > 0.4;

  return (
    <>
      <line
        x1={x}
        x2={x}
        y1={top}
        y2={foot}
        strokeWidth="2"
        strokeDasharray={part === "reserve" ? "4 3" : undefined}
        className="stroke-ink"
        data-part={part}
        data-at={at}
      />
      {children ? (
        <text
          x={x}
          dx={leftOf ? -6 : 6}
          y={top + 9}
          textAnchor={leftOf ? "end" : "start"}
          strokeWidth="3"
          className="fill-ink stroke-sheet text-xs [paint-order:stroke]"
        >
          {children}
        </text>
      ) : null}
    </>
  );
}

function Ruler({ layout: { scale, ticks }, y }: { layout: StaveLayout; y: number }) {
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
              {formatExact(tick)}
            </text>
          </g>
        );
      })}
    </>
  );
}

import { type ReactNode, useId } from "react";

import { NEWTONS, type Reading, readNumber, readText } from "@/lib/evaluation/measures/reading";

import { DimensionLines } from "./dimension-lines";
import { type Dimension, placeDimensions } from "./dimension-rows";
import { Ruler } from "./ruler";
import { type Scale, fractionOf, percent } from "./scale";
import { type Span, type StaveInput, type StaveLayout, type StaveSegment, staveLayout } from "./stave-layout";

const BAR = { top: 36, height: 38 };
const RULER = 86;
const FIRST_ROW = 134;
const ROW_STEP = 38;

/** One total to scale: items solid in order, growth hatched at their end, posts for limit and reserve, a ruler, dimensions. */
export function Stave({ input, reading = NEWTONS }: { input: StaveInput; reading?: Reading }) {
  const layout = staveLayout(input, reading.perNewton);
  const rows = dimensionRows(input, reading)
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
      <StaveBar layout={layout} top={BAR.top} height={BAR.height} reading={reading} named />
      <Posts layout={layout} top={4} foot={RULER} reading={reading} labelled />
      <Ruler layout={layout} y={RULER} reading={reading} />
      {rows.map((row, at) => (
        <DimensionLines key={at} scale={scale} row={row} y={FIRST_ROW + ROW_STEP * at} />
      ))}
    </svg>
  );
}

function dimensionRows({ basic, growth, predicted, limit }: StaveInput, reading: Reading): Dimension[][] {
  const built = [
    { from: 0, to: basic, value: readText(reading, basic), word: "basic" },
    { from: basic, to: predicted, value: readNumber(reading, growth), word: "growth" },
  ];
  const total = { from: 0, to: predicted, value: readText(reading, predicted), word: "predicted" };
  if (limit === null) return [built, [total]];

  const distance = readNumber(reading, Math.abs(limit - predicted));
  if (predicted > limit) return [built, [total], [{ from: limit, to: predicted, value: distance, word: "over" }]];
  return [built, [total, { from: predicted, to: limit, value: distance, word: "to limit" }]];
}

interface StaveBarProps {
  layout: StaveLayout;
  /** The scale to draw to, where several staves stand above one another. */
  scale?: Scale;
  top: number;
  height: number;
  reading?: Reading;
  named?: boolean;
}

/** The bar of a stave: solid, hatched, and what lies beyond the limit. */
export function StaveBar({
  layout,
  scale = layout.scale,
  top,
  height,
  reading = NEWTONS,
  named = false,
}: StaveBarProps) {
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
      {savings ? (
        <Hollow
          span={savings}
          scale={scale}
          top={top}
          height={height}
          savings={named ? readNumber(reading, savings.from) : null}
        />
      ) : null}
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
function Hollow({ span, scale, top, height, savings }: BandProps & { savings: string | null }) {
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
      {savings !== null && fractionOf(scale, span.to) - fractionOf(scale, span.from) > 0.12 ? (
        <text x="6" y={height - 8} className="fill-ink text-xs">
          savings {savings}
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
  reading?: Reading;
  labelled?: boolean;
}

/** The limit solid, the reserve dashed, both in ink. Their labels stand on two lines, so that they never meet. */
export function Posts({ layout, scale = layout.scale, top, foot, reading = NEWTONS, labelled }: PostsProps) {
  const { limit, reserveFrom } = layout;

  return (
    <>
      {reserveFrom === null ? null : (
        <Post at={reserveFrom} scale={scale} top={labelled ? top + 16 : top} foot={foot} part="reserve">
          {labelled ? `reserve from ${readNumber(reading, reserveFrom)}` : null}
        </Post>
      )}
      {limit === null ? null : (
        <Post at={limit} scale={scale} top={top} foot={foot} part="limit">
          {labelled ? `limit ${readNumber(reading, limit)}` : null}
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

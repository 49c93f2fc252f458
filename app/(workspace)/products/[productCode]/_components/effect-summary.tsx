import { SaveFigure } from "@/app/_components/save-figure/save-figure";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { PointEffect, PointFigures } from "@/lib/evaluation/budget/effects";
import type { EffectView } from "@/lib/proposals/views";
import {
  formatHundredths,
  formatNewtons,
  formatNewtonsChangeNumber,
  formatNewtonsNumber,
} from "@/lib/units/format-newtons";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

import { StavePair } from "../_pictures/stave-pair";

interface EffectSummaryProps {
  effect: EffectView;
  /** "with TF2-CP-04": names the lower stave. */
  withLabel: string;
  /** Draws a pair of staves for each operating point in place of the worst alone. */
  everyPoint?: boolean;
}

/** What a change does to the total: in a sentence, drawn, and in figures at every operating point. */
export function EffectSummary({ effect, withLabel, everyPoint = false }: EffectSummaryProps) {
  return (
    <>
      <p className="mb-3 text-xl font-semibold">{effect.sentence}</p>
      {effect.points.slice(0, everyPoint ? undefined : 1).map((point) => (
        <figure key={point.operatingPoint} className="mb-4">
          <div role="img" aria-label={staveSentence(point)}>
            <StavePair staves={stavesOf(effect.onIssue, point, withLabel)} />
          </div>
          <figcaption className="mt-1 text-xs text-ink-2">
            {point.operatingPoint} {point.name}: solid is basic, hatched is growth; the post is the limit, the dashed
            post where the reserve begins.
            <SaveFigure />
          </figcaption>
        </figure>
      ))}
      <PointsTable effect={effect} />
    </>
  );
}

function staveSentence({ operatingPoint, was, now }: PointEffect): string {
  const figures = now ?? was;
  const limit = figures ? `, limit ${formatHundredths(figures.limitHundredths)} N` : "";
  return `Predicted at ${operatingPoint} ${sidesText(was, now)}${limit}. The figures stand in the table below.`;
}

function sidesText(was: PointFigures | null, now: PointFigures | null): string {
  if (was && now) return `from ${formatNewtons(was.predicted)} to ${formatNewtons(now.predicted)}`;
  return now ? `${formatNewtons(now.predicted)}, a new operating point` : "no longer, it is retired";
}

/** An operating point that stands on one side only has one stave. */
function stavesOf(issue: number, { was, now }: PointEffect, withLabel: string) {
  return [...(was ? [staveOf(`issue ${issue}`, was)] : []), ...(now ? [staveOf(withLabel, now)] : [])];
}

function staveOf(label: string, { basic, predicted, limitHundredths, reserveHundredths }: PointFigures) {
  return {
    label,
    text: `${formatNewtons(predicted)} predicted`,
    input: {
      items: [{ number: "", name: "", basic }],
      basic,
      growth: predicted - basic,
      predicted,
      limit: limitHundredths / 100,
      reserve: reserveHundredths / 100,
    },
  };
}

function PointsTable({ effect }: { effect: EffectView }) {
  return (
    <Table caption={`Effect at every operating point, on issue ${effect.onIssue}`} showCaption narrow="stack">
      <TableHead>
        <Head>Operating point</Head>
        <Head numeric unit="N">
          Predicted, issue {effect.onIssue}
        </Head>
        <Head numeric unit="N">
          To be
        </Head>
        <Head numeric unit="N">
          Effect
        </Head>
        <Head numeric unit="N">
          Margin to limit
        </Head>
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {effect.points.map((point) => (
          <Row key={point.operatingPoint}>
            <RowHead label="Operating point">
              {point.operatingPoint} {point.name}
            </RowHead>
            <Cell numeric label={`Issue ${effect.onIssue}`}>
              {point.was ? formatNewtonsNumber(point.was.predicted) : "–"}
            </Cell>
            <Cell numeric label="To be">
              {point.now ? formatNewtonsNumber(point.now.predicted) : "–"}
            </Cell>
            <Cell numeric label="Effect">
              {formatNewtonsChangeNumber(point.predictedDelta)}
            </Cell>
            <Cell numeric label="Margin">
              {[point.was, point.now].map(marginText).join(" → ")}
            </Cell>
            <Cell label="Standing">
              <Standings point={point} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function marginText(figures: PointFigures | null): string {
  return figures ? formatNewtonsNumber(figures.margin) : "–";
}

function Standings({ point: { was, now } }: { point: PointEffect }) {
  if (!now) return "retired";
  const name = STANDING_NAMES[now.standing];
  const before = was ? STANDING_NAMES[was.standing] : "new";
  const text = was?.standing === now.standing ? name : `${before} → ${name}`;

  return <span className={now.standing === "over" ? "font-semibold text-signal" : ""}>{text}</span>;
}

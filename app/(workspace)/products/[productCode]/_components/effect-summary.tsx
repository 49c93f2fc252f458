import {
  type EffectReading,
  type EffectReadings,
  effectText,
  movesBasis,
  readingAt,
} from "@/app/(workspace)/_measures/effect-readings";
import { SaveFigure } from "@/app/_components/save-figure/save-figure";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { PointEffect, PointFigures } from "@/lib/evaluation/budget/effects";
import { type Reading, readNumber, readText } from "@/lib/evaluation/measures/reading";
import type { EffectView } from "@/lib/proposals/views";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

import { StavePair } from "../_pictures/stave-pair";

interface EffectSummaryProps {
  effect: EffectView;
  /** "with TF2-CP-04": names the lower stave. */
  withLabel: string;
  /** Draws a pair of staves for each operating point in place of the worst alone. */
  everyPoint?: boolean;
  readings: EffectReadings;
}

/** What a change does to the total: in a sentence, drawn, and in figures at every operating point. */
export function EffectSummary({ effect, withLabel, everyPoint = false, readings }: EffectSummaryProps) {
  const shifted = effect.points.filter(({ operatingPoint }) => movesBasis(readingAt(readings, operatingPoint)));

  return (
    <>
      <p className="mb-3 text-xl font-semibold">{effect.sentence}</p>
      {readings.isKept || shifted.length === 0 ? null : (
        <p className="mb-3 text-sm text-ink-2">
          At {shifted.map(({ operatingPoint }) => operatingPoint).join(", ")} the change moves what a force is referred
          to: each side is read by its own stream and terms.
        </p>
      )}
      {effect.points.slice(0, everyPoint ? undefined : 1).map((point) => (
        <PointFigure
          key={point.operatingPoint}
          point={point}
          issue={effect.onIssue}
          withLabel={withLabel}
          reading={readingAt(readings, point.operatingPoint)}
        />
      ))}
      <PointsTable effect={effect} readings={readings} />
    </>
  );
}

interface PointFigureProps {
  point: PointEffect;
  issue: number;
  withLabel: string;
  reading: EffectReading;
}

function PointFigure({ point, issue, withLabel, reading }: PointFigureProps) {
  const { operatingPoint, name, was, now } = point;
  // An operating point that stands on one side only has one stave.
  const staves = [
    ...(was ? [staveOf(`issue ${issue}`, was, reading.was)] : []),
    ...(now ? [staveOf(withLabel, now, reading.now)] : []),
  ];

  return (
    <figure className="mb-4">
      <div role="img" aria-label={staveSentence(point, reading)}>
        <StavePair staves={staves} />
      </div>
      <figcaption className="mt-1 text-xs text-ink-2">
        {operatingPoint} {name}: solid is basic, hatched is growth; the post is the limit, the dashed post where the
        reserve begins.
        <SaveFigure />
      </figcaption>
    </figure>
  );
}

function staveSentence({ operatingPoint, was, now }: PointEffect, reading: EffectReading): string {
  const figures = now ?? was;
  const side = now ? reading.now : reading.was;
  const limit = figures ? `, limit ${readText(side, figures.limitHundredths / 100)}` : "";
  return `Predicted at ${operatingPoint} ${sidesText(was, now, reading)}${limit}. The figures stand in the table below.`;
}

function sidesText(was: PointFigures | null, now: PointFigures | null, reading: EffectReading): string {
  if (was && now) return `from ${readText(reading.was, was.predicted)} to ${readText(reading.now, now.predicted)}`;
  return now ? `${readText(reading.now, now.predicted)}, a new operating point` : "no longer, it is retired";
}

function staveOf(label: string, figures: PointFigures, reading: Reading) {
  const { basic, predicted, limitHundredths, reserveHundredths } = figures;
  return {
    label,
    text: `${readText(reading, predicted)} predicted`,
    perNewton: reading.perNewton,
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

function PointsTable({ effect, readings }: { effect: EffectView; readings: EffectReadings }) {
  const unit = readings.unit ?? undefined;

  return (
    <Table caption={`Effect at every operating point, on issue ${effect.onIssue}`} showCaption narrow="stack">
      <TableHead>
        <Head>Operating point</Head>
        {[`Predicted, issue ${effect.onIssue}`, "To be", "Effect", "Margin to limit"].map((label) => (
          <Head key={label} numeric unit={unit}>
            {label}
          </Head>
        ))}
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {effect.points.map((point) => (
          <PointRow key={point.operatingPoint} point={point} issue={effect.onIssue} readings={readings} />
        ))}
      </tbody>
    </Table>
  );
}

function PointRow({ point, issue, readings }: { point: PointEffect; issue: number; readings: EffectReadings }) {
  const { operatingPoint, name, was, now, predictedDelta } = point;
  const reading = readingAt(readings, operatingPoint);
  const print = readings.unit === null ? readText : readNumber;
  const moved = { was: was?.predicted ?? null, now: now?.predicted ?? null, delta: predictedDelta };

  return (
    <Row>
      <RowHead label="Operating point">
        {operatingPoint} {name}
      </RowHead>
      <Cell numeric label={`Issue ${issue}`}>
        {was ? print(reading.was, was.predicted) : "–"}
      </Cell>
      <Cell numeric label="To be">
        {now ? print(reading.now, now.predicted) : "–"}
      </Cell>
      <Cell numeric label="Effect">
        {effectText(reading, moved, readings.unit === null)}
      </Cell>
      <Cell numeric label="Margin">
        {was ? print(reading.was, was.margin) : "–"} → {now ? print(reading.now, now.margin) : "–"}
      </Cell>
      <Cell label="Standing">
        <Standings point={point} />
      </Cell>
    </Row>
  );
}

function Standings({ point: { was, now } }: { point: PointEffect }) {
  if (!now) return "retired";
  const name = STANDING_NAMES[now.standing];
  const before = was ? STANDING_NAMES[was.standing] : "new";
  const text = was?.standing === now.standing ? name : `${before} → ${name}`;

  return <span className={now.standing === "over" ? "font-semibold text-signal" : ""}>{text}</span>;
}

import { SaveFigure } from "@/app/_components/save-figure/save-figure";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { EffectView, PointEffectView } from "@/lib/proposals/views";
import { formatNewtons, formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";
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

function staveSentence({ operatingPoint, predictedWas, predictedNow, limitNow }: PointEffectView): string {
  return (
    `Predicted at ${operatingPoint} from ${formatNewtons(predictedWas)} to ${formatNewtons(predictedNow)}, ` +
    `limit ${formatNewtons(limitNow)}. The figures stand in the table below.`
  );
}

function stavesOf(issue: number, point: PointEffectView, withLabel: string) {
  const one = (label: string, basic: number, predicted: number, limit: number, reserve: number) => ({
    label,
    text: `${formatNewtons(predicted)} predicted`,
    input: {
      items: [{ number: "", name: "", basic }],
      basic,
      growth: predicted - basic,
      predicted,
      limit,
      reserve,
    },
  });

  return [
    one(`issue ${issue}`, point.basicWas, point.predictedWas, point.limitWas, point.reserveWas),
    one(withLabel, point.basicNow, point.predictedNow, point.limitNow, point.reserveNow),
  ];
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
              {formatNewtonsNumber(point.predictedWas)}
            </Cell>
            <Cell numeric label="To be">
              {formatNewtonsNumber(point.predictedNow)}
            </Cell>
            <Cell numeric label="Effect">
              {formatNewtonsChangeNumber(point.predictedDelta)}
            </Cell>
            <Cell numeric label="Margin">
              {formatNewtonsNumber(point.marginWas)} → {formatNewtonsNumber(point.marginNow)}
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

function Standings({ point }: { point: PointEffectView }) {
  const now = STANDING_NAMES[point.standingNow];
  const text = point.standingWas === point.standingNow ? now : `${STANDING_NAMES[point.standingWas]} → ${now}`;

  return <span className={point.standingNow === "over" ? "font-semibold text-signal" : ""}>{text}</span>;
}

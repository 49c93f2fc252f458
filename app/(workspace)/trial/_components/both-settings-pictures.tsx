"use client";

import { memo } from "react";

import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import {
  dragAt,
  dragOverSpeed,
  dragOverSpeedLayout,
  type SpeedCurve,
} from "@/app/(workspace)/_friction-pictures/drag-over-speed";
import { frictionChart } from "@/app/(workspace)/_friction-pictures/friction-chart";
import { frictionChartLayout } from "@/app/(workspace)/_friction-pictures/friction-chart-layout";
import { type FrictionSubject, frictionSubject } from "@/app/(workspace)/_friction-pictures/friction-subject";
import { Plot } from "@/app/(workspace)/_friction-pictures/plot";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatSignificant } from "@/lib/units/format-number";
import { formatResult } from "@/lib/units/format-quantity";

import type { TrialResult } from "../_trial/read-setting";

interface BothSettingsPicturesProps {
  a: TrialResult | null;
  b: TrialResult | null;
}

/** A and B in one picture, where both are of one kind; drawn anew only when a result is another. */
export const BothSettingsPictures = memo(function BothSettingsPictures({ a, b }: BothSettingsPicturesProps) {
  if (!a?.input || !b?.input || a.input.method !== b.input.method || a.input.method === "fixed") return null;
  const subjects = [
    frictionSubject(a.version, a.input, a.stream),
    frictionSubject(b.version, b.input, b.stream),
  ] as const;
  const curves = [curveOf("A", a), curveOf("B", b)].filter((curve) => curve !== null);

  return (
    <section aria-label="A and B in one picture" className="grid gap-x-10 lg:grid-cols-2">
      {subjects[0] && subjects[1] ? <BothOnChart a={subjects[0]} b={subjects[1]} /> : null}
      {curves.length === 2 ? <BothOverSpeed curves={curves} /> : null}
    </section>
  );
});

function curveOf(word: "A" | "B", { version, input, stream }: TrialResult): SpeedCurve | null {
  const drag = input ? dragAt(version, input, stream) : null;
  if (!input || drag === null) return null;

  return { word, points: dragOverSpeed(version, input, stream), own: { speed: stream.speed, drag } };
}

function BothOnChart({ a, b }: { a: FrictionSubject; b: FrictionSubject }) {
  const charts = [frictionChart(a), frictionChart(b)] as const;
  const rows = charts.map(({ own }, at) => ({ word: at === 0 ? "A" : "B", ...own }));
  const texts = rows.map(
    ({ word, reynolds, coefficient }) =>
      `${word} stands at Re ${formatSignificant(reynolds)} with ${formatSignificant(coefficient)}`,
  );

  return (
    <FigureWithTable
      summary={`Both settings on one friction chart: ${texts.join(", ")}.`}
      picture={<Plot layout={frictionChartLayout(...charts)} />}
      caption={
        <span>
          Both on one friction chart. Ring and thick line: A; square and thin line of the same colour: B. The other
          lines are those of A&apos;s chart below.
        </span>
      }
      table={
        <Table caption="Mean coefficient of friction of both settings">
          <TableHead>
            <Head>Setting</Head>
            <Head numeric>Re</Head>
            <Head numeric>Mean coefficient</Head>
          </TableHead>
          <tbody>
            {rows.map(({ word, reynolds, coefficient }) => (
              <Row key={word}>
                <RowHead>{word}</RowHead>
                <Cell numeric>{formatSignificant(reynolds)}</Cell>
                <Cell numeric>{formatSignificant(coefficient)}</Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      }
    />
  );
}

function BothOverSpeed({ curves }: { curves: readonly SpeedCurve[] }) {
  const texts = curves.map(
    ({ word, own }) => `${word} has ${formatNewtons(own.drag)} at ${formatResult(own.speed, "m/s")}`,
  );

  return (
    <FigureWithTable
      summary={`Drag of both settings over speed: ${texts.join(", ")}.`}
      picture={<Plot layout={dragOverSpeedLayout(curves)} />}
      caption={<span>Drag of both over speed. Ring and solid line: A; square and dashed line: B.</span>}
      table={<SpeedsTable curves={curves} />}
    />
  );
}

/** Every third point is enough to read a curve by. */
const EVERY = 3;

function SpeedsTable({ curves }: { curves: readonly SpeedCurve[] }) {
  const rows = curves.flatMap(({ word, points }) =>
    points.filter((_, at) => at % EVERY === 0).map((point) => ({ word, ...point })),
  );

  return (
    <Table caption="Drag of both settings over speed">
      <TableHead>
        <Head>Setting</Head>
        <Head numeric unit="m/s">
          Speed
        </Head>
        <Head numeric unit="N">
          Drag
        </Head>
      </TableHead>
      <tbody>
        {rows.map(({ word, speed, drag }) => (
          <Row key={`${word} ${speed}`}>
            <RowHead>{word}</RowHead>
            <Cell numeric>{formatSignificant(speed)}</Cell>
            <Cell numeric>{drag === null ? "refused" : formatNewtonsNumber(drag)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

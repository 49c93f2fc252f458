import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { NEWTONS, type Reading, readNumber, readText } from "@/lib/evaluation/measures/reading";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

import { StavePair } from "@/app/(workspace)/products/[productCode]/_pictures/stave-pair";
import { budgetSheet, sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";
import { inUnit } from "./in-unit";

interface ReadPoint {
  point: PointResult;
  /** Each operating point refers its forces to its own stream. */
  reading: Reading;
}

/** A stave for each operating point, all on one scale of one measure. */
export function PointsFigure({ budget, chosen }: { budget: BudgetAt; chosen: ChosenMeasure }) {
  const { points, lacking } = readPoints(budget, chosen);
  const [first] = points;
  const staves = points.map(({ point, reading }) => ({
    label: point.operatingPoint,
    input: staveInput(budgetSheet(budget, point).rows, point),
    perNewton: reading.perNewton,
    text: `${readText(reading, point.totals.predicted)} predicted`,
  }));
  const unit = first ? inUnit(first.reading) : "";

  return (
    <>
      {lacking.length > 0 ? (
        <p className="mb-2 text-sm text-ink-2">
          {MEASURE_NAMES[chosen.measure]} can’t be told at {lacking.join(", ")}, so that there is no one scale for all:
          forces are drawn instead.
        </p>
      ) : null}
      <FigureWithTable
        summary={points
          .map(({ point, reading }) => `${point.operatingPoint}: ${sentenceOf(point, reading)}`)
          .join(". ")}
        picture={<StavePair staves={staves} />}
        caption={`Solid: basic, item by item; hatched: growth. Post: limit; dashed post: where the reserve begins. Every force${unit}, one scale, each operating point by its own stream.`}
        table={<PointsTable points={points} unit={unit} />}
      />
    </>
  );
}

/** In newtons where an operating point lacks the measure: one scale has one unit. */
function readPoints(budget: BudgetAt, chosen: ChosenMeasure): { points: ReadPoint[]; lacking: string[] } {
  const points = budget.results.points.map((point) => ({
    point,
    reading: readingFor(chosen, sheetBasis(budgetSheet(budget, point))),
  }));
  const lacking = points.filter(({ reading }) => reading.measure !== chosen.measure);
  if (lacking.length === 0) return { points, lacking: [] };
  return {
    points: points.map(({ point }) => ({ point, reading: NEWTONS })),
    lacking: lacking.map(({ point }) => point.operatingPoint),
  };
}

function sentenceOf(point: PointResult, reading: Reading): string {
  return standingSentence(point, (newtons) => readText(reading, newtons));
}

function PointsTable({ points, unit }: { points: readonly ReadPoint[]; unit: string }) {
  return (
    <Table caption={`The numbers of the picture${unit}`}>
      <TableHead>
        <Head>Operating point</Head>
        {["Basic", "Growth", "Predicted", "Reserve", "Limit"].map((label) => (
          <Head key={label} numeric>
            {label}
          </Head>
        ))}
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {points.map(({ point, reading }) => {
          const { totals, reserveHundredths, limitHundredths } = point;
          const figures = [
            totals.basic,
            totals.growth,
            totals.predicted,
            reserveHundredths / 100,
            limitHundredths / 100,
          ];
          return (
            <Row key={point.operatingPoint}>
              <RowHead>
                {point.operatingPoint} {point.name}
              </RowHead>
              {figures.map((newtons, at) => (
                <Cell key={at} numeric>
                  {readNumber(reading, newtons)}
                </Cell>
              ))}
              <Cell>{sentenceOf(point, reading)}</Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}

import type { ReactNode } from "react";

import type { ChosenMeasure } from "@/app/(workspace)/_measures/chosen-measure";
import { speedReading } from "@/app/(workspace)/_measures/speed-reading";
import type { SpeedReading } from "@/app/(workspace)/_friction-pictures/drag-over-speed";
import { Plot } from "@/app/(workspace)/_friction-pictures/plot";
import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { totalOverSpeed, type TotalAtSpeed } from "@/lib/evaluation/budget/total-over-speed";
import { readNumber, readText } from "@/lib/evaluation/measures/reading";
import { formatSignificant } from "@/lib/units/format-number";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

import { totalOverSpeedLayout } from "@/app/(workspace)/products/[productCode]/_pictures/total-over-speed-layout";
import { budgetSheet, sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";

const POINTS_OF_CURVE = 31;
const POINTS_OF_TABLE = 11;

interface SpeedFiguresProps {
  budget: BudgetAt;
  point: PointResult;
  chosen: ChosenMeasure;
}

/** The whole budget in the same fluid at other speeds: in the chosen measure, and for what moves its power besides. */
export function SpeedFigures({ budget, point, chosen }: SpeedFiguresProps) {
  const { units } = chosen;
  const basis = sheetBasis(budgetSheet(budget, point));
  const isMoving = budget.product.kind === "vehicle_fairing" && chosen.measure !== "power";
  const readings = [
    speedReading(chosen, basis),
    ...(isMoving ? [speedReading({ measure: "power", units }, basis)] : []),
  ];
  const points = totalOverSpeed(budget.state, point.operatingPoint, POINTS_OF_CURVE);
  const table = <SpeedTable budget={budget} point={point} readings={readings} />;

  return readings.map((reading) => (
    <SpeedFigure key={reading.at(basis.speed).measure} points={points} point={point} reading={reading} table={table} />
  ));
}

interface SpeedFigureProps {
  points: readonly TotalAtSpeed[];
  point: PointResult;
  reading: SpeedReading;
  table: ReactNode;
}

function SpeedFigure({ points, point, reading, table }: SpeedFigureProps) {
  const limit = point.limitHundredths / 100;
  const own = { speed: point.stream.speed, predicted: point.totals.predicted, limit };
  const read = reading.at(own.speed);
  const name = MEASURE_NAMES[read.measure];
  const broken = points.some(({ totals }) => totals === null) ? " Where an item is refused there is no line." : "";
  const goesWithSpeed = reading.at(2 * own.speed).perNewton !== read.perNewton;
  const byStream = goesWithSpeed ? " Each force is read by the stream of its speed." : "";
  const speed = `${formatSignificant(own.speed * reading.speed.perSi)} ${reading.speed.unit}`;

  return (
    <FigureWithTable
      summary={`${name} over speed: predicted ${readText(read, own.predicted)} at ${speed}, ${point.operatingPoint}, limit ${readText(read, limit)}.`}
      picture={<Plot layout={totalOverSpeedLayout(points, own, reading)} />}
      caption={`${name}. Thick: predicted total; thin: basic total; black: the limit, in newtons the same at every speed. The ring is the operating point.${byStream}${broken}`}
      table={table}
    />
  );
}

interface SpeedTableProps {
  budget: BudgetAt;
  point: PointResult;
  readings: readonly SpeedReading[];
}

function SpeedTable({ budget, point, readings }: SpeedTableProps) {
  const [first, ...others] = readings;
  if (!first) return null;
  const own = point.stream.speed;
  const unit = first.at(own).unit;

  return (
    <Table caption={`The whole budget over speed, in the fluid of ${point.operatingPoint}`}>
      <TableHead>
        <Head unit={first.speed.unit}>Speed</Head>
        <Head numeric unit={unit}>
          Basic
        </Head>
        <Head numeric unit={unit}>
          Predicted
        </Head>
        {others.map((reading) => (
          <Head key={reading.at(own).measure} numeric unit={reading.at(own).unit}>
            {MEASURE_NAMES[reading.at(own).measure]}
          </Head>
        ))}
      </TableHead>
      <tbody>
        {totalOverSpeed(budget.state, point.operatingPoint, POINTS_OF_TABLE).map(({ speed, totals }) => (
          <Row key={speed}>
            <RowHead>{formatSignificant(speed * first.speed.perSi)}</RowHead>
            {[totals?.basic, totals?.predicted].map((newtons, at) => (
              <Cell key={at} numeric>
                {newtons === undefined ? "refused" : readNumber(first.at(speed), newtons)}
              </Cell>
            ))}
            {others.map((reading) => (
              <Cell key={reading.at(own).measure} numeric>
                {totals === null ? "refused" : readNumber(reading.at(speed), totals.predicted)}
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

import { Plot } from "@/app/(workspace)/_friction-pictures/plot";
import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { totalOverSpeed, type TotalAtSpeed } from "@/lib/evaluation/budget/total-over-speed";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatSignificant } from "@/lib/units/format-number";
import { formatResult } from "@/lib/units/format-quantity";

import {
  dragOverSpeedLayout,
  powerOverSpeedLayout,
} from "@/app/(workspace)/products/[productCode]/_pictures/total-over-speed-layout";

const POINTS_OF_CURVE = 31;
const POINTS_OF_TABLE = 11;

/** The whole budget in the same fluid at other speeds: drag, and for what moves the power. */
export function SpeedFigures({ budget, point }: { budget: BudgetAt; point: PointResult }) {
  const points = totalOverSpeed(budget.state, point.operatingPoint, POINTS_OF_CURVE);
  const limit = point.limitHundredths / 100;
  const own = { speed: point.stream.speed, predicted: point.totals.predicted, limit };
  const at = `${formatResult(own.speed, "m/s")}, ${point.operatingPoint}`;
  const isMoving = budget.product.kind === "vehicle_fairing";
  const broken = points.some(({ totals }) => totals === null) ? " Where an item is refused there is no line." : "";
  const table = <SpeedTable budget={budget} point={point} isMoving={isMoving} />;

  return (
    <>
      <FigureWithTable
        summary={`Drag over speed: predicted ${formatNewtons(own.predicted)} at ${at}, limit ${formatNewtons(limit)}.`}
        picture={<Plot layout={dragOverSpeedLayout(points, own)} />}
        caption={`Thick: predicted total; thin: basic total; black: the limit. The ring is the operating point.${broken}`}
        table={table}
      />
      {isMoving ? (
        <FigureWithTable
          summary={`Power over speed: ${formatSignificant(own.predicted * own.speed)} W at ${at}.`}
          picture={<Plot layout={powerOverSpeedLayout(points, own)} />}
          caption={`Thick: predicted drag times speed; black: what the limit allows at that speed.${broken}`}
          table={table}
        />
      ) : null}
    </>
  );
}

function SpeedTable({ budget, point, isMoving }: { budget: BudgetAt; point: PointResult; isMoving: boolean }) {
  return (
    <Table caption={`The whole budget over speed, in the fluid of ${point.operatingPoint}`}>
      <TableHead>
        <Head unit="m/s">Speed</Head>
        <Head numeric unit="N">
          Basic
        </Head>
        <Head numeric unit="N">
          Predicted
        </Head>
        {isMoving ? (
          <Head numeric unit="W">
            Power
          </Head>
        ) : null}
      </TableHead>
      <tbody>
        {totalOverSpeed(budget.state, point.operatingPoint, POINTS_OF_TABLE).map((row) => (
          <SpeedRow key={row.speed} row={row} isMoving={isMoving} />
        ))}
      </tbody>
    </Table>
  );
}

function SpeedRow({ row: { speed, totals }, isMoving }: { row: TotalAtSpeed; isMoving: boolean }) {
  return (
    <Row>
      <RowHead>{formatSignificant(speed)}</RowHead>
      <Cell numeric>{totals === null ? "refused" : formatNewtonsNumber(totals.basic)}</Cell>
      <Cell numeric>{totals === null ? "refused" : formatNewtonsNumber(totals.predicted)}</Cell>
      {isMoving ? (
        <Cell numeric>{totals === null ? "refused" : formatSignificant(totals.predicted * speed)}</Cell>
      ) : null}
    </Row>
  );
}

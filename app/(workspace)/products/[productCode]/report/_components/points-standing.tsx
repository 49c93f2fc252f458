import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { formatHundredths, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

interface PointsStandingProps {
  points: readonly PointResult[];
  worstPoint: string;
}

/** Every operating point with its margin, and what the margin is of; the worst named first. */
export function PointsStanding({ points, worstPoint }: PointsStandingProps) {
  const ordered = points.toSorted(
    (one, other) => Number(other.operatingPoint === worstPoint) - Number(one.operatingPoint === worstPoint),
  );

  return (
    <Table caption="Standing at every operating point" narrow="stack">
      <TableHead>
        <Head>Operating point</Head>
        <Head numeric unit="N">
          Predicted
        </Head>
        <Head numeric unit="N">
          Limit
        </Head>
        <Head numeric unit="N">
          Reserve
        </Head>
        <Head numeric unit="N">
          To limit
        </Head>
        <Head numeric unit="of the limit">
          Margin
        </Head>
        <Head numeric unit="N">
          Clear of the reserve
        </Head>
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {ordered.map((point) => (
          <PointRow key={point.operatingPoint} point={point} isWorst={point.operatingPoint === worstPoint} />
        ))}
      </tbody>
    </Table>
  );
}

function PointRow({ point, isWorst }: { point: PointResult; isWorst: boolean }) {
  const { totals, limitHundredths, reserveHundredths, standing } = point;

  return (
    <Row>
      <RowHead label="Operating point">
        {point.operatingPoint} {point.name}
        {isWorst ? <span className="text-ink-2">, the worst</span> : null}
      </RowHead>
      <Cell numeric label="Predicted, N">
        {formatNewtonsNumber(totals.predicted)}
      </Cell>
      <Cell numeric label="Limit, N">
        {formatHundredths(limitHundredths)}
      </Cell>
      <Cell numeric label="Reserve, N">
        {formatHundredths(reserveHundredths)}
      </Cell>
      <Cell numeric label="To limit, N">
        {formatNewtonsNumber(totals.margin)}
      </Cell>
      <Cell numeric label="Margin, of the limit">
        {formatPercent(totals.margin / (limitHundredths / 100), 1)}
      </Cell>
      <Cell numeric label="Clear of the reserve, N">
        {formatNewtonsNumber(totals.clearOfReserve)}
      </Cell>
      <Cell label="Standing" className={standing === "over" ? "font-semibold text-signal" : undefined}>
        {STANDING_NAMES[standing]}
      </Cell>
    </Row>
  );
}

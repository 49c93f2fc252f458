import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { readNumber, readText } from "@/lib/evaluation/measures/reading";
import { formatPercent } from "@/lib/units/format-number";

import {
  type BudgetSheet,
  type ItemRow,
  sheetBasis,
} from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { isOver } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";

export interface PointRow {
  sheet: BudgetSheet;
  row: ItemRow;
}

interface ResultsTableProps {
  points: readonly PointRow[];
  measure: ChosenMeasure;
}

/** The item's result at every operating point of the budget; each point refers a force to its own stream. */
export function ResultsTable({ points, measure }: ResultsTableProps) {
  const units = new Set(points.map(({ sheet }) => readingFor(measure, sheetBasis(sheet)).unit));
  // Where a point lacks the measure its row is in newtons, and every figure says its unit.
  const [common = ""] = units.size === 1 ? units : [];

  return (
    <Table caption={`Result at every operating point${common ? `, in ${common}` : ""}`} narrow="stack">
      <TableHead>
        <Head>Operating point</Head>
        <Head numeric unit={common}>
          Basic
        </Head>
        <Head numeric unit="of basic">
          Growth
        </Head>
        {["Growth", "Predicted", "Allocation", "Margin"].map((label) => (
          <Head key={label} numeric unit={common}>
            {label}
          </Head>
        ))}
      </TableHead>
      <tbody>
        {points.map(({ sheet, row }) => (
          <ResultRow
            key={sheet.point.operatingPoint}
            sheet={sheet}
            row={row}
            measure={measure}
            alone={units.size === 1}
          />
        ))}
      </tbody>
    </Table>
  );
}

interface ResultRowProps extends PointRow {
  measure: ChosenMeasure;
  /** The unit stands in the heads of the columns. */
  alone: boolean;
}

function ResultRow({ sheet, row, measure, alone }: ResultRowProps) {
  const { point, isReference } = sheet;
  const reading = readingFor(measure, sheetBasis(sheet));
  const print = (newtons: number) => (alone ? readNumber(reading, newtons) : readText(reading, newtons));
  const { result, allocationHundredths, marginHundredths } = row;
  const over = isReference && isOver(row);
  const inUnit = (label: string) => (alone && reading.unit ? `${label}, ${reading.unit}` : label);

  return (
    <Row>
      <RowHead label="Operating point">
        {point.operatingPoint} {point.name}
        {isReference ? <span className="block text-xs text-ink-2">reference: allocations are set here</span> : null}
      </RowHead>
      <Cell numeric label={inUnit("Basic")}>
        {result.refused ? "refused" : print(row.basic)}
      </Cell>
      <Cell numeric label="Growth, of basic">
        {formatPercent(result.growthFraction)}
      </Cell>
      <Cell numeric label={inUnit("Growth")}>
        {print(row.growth)}
      </Cell>
      <Cell numeric label={inUnit("Predicted")}>
        {print(row.predicted)}
      </Cell>
      <Cell numeric label={inUnit("Allocation")}>
        {allocationHundredths === null ? "none" : print(allocationHundredths / 100)}
      </Cell>
      <Cell numeric label={inUnit("Margin")} className={over ? "font-semibold text-signal" : undefined}>
        {marginHundredths === null ? "–" : print(marginHundredths / 100)}
        {over ? <span className="block text-xs">over</span> : null}
      </Cell>
    </Row>
  );
}

import { FigureWithTable } from "@/app/_components/figure-with-table";
import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { sensitivities, type Variable } from "@/lib/evaluation/budget/sensitivity";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { isKept, type Reading } from "@/lib/evaluation/measures/reading";

import {
  changeText,
  type SensitivityBar,
  SensitivityPicture,
} from "@/app/(workspace)/products/[productCode]/_pictures/sensitivity-picture";
import { inUnit } from "./in-unit";

const NAMES: Record<Variable, string> = {
  speed: "Speed, 1 %",
  temperature: "Temperature, 5 K",
  roughness: "Roughness k_s, 10 %",
  drag_coefficient: "C_D, 10 %",
};

interface SensitivityFigureProps {
  state: BudgetState;
  point: PointResult;
  reading: Reading;
}

/** What the predicted total moves by when one thing moves everywhere, the greatest first. */
export function SensitivityFigure({ state, point, reading }: SensitivityFigureProps) {
  const bars = sensitivities(state, point.operatingPoint).map(({ variable, lower, higher }) => ({
    ...{ label: NAMES[variable], lower, higher },
  }));
  const [first] = bars;
  if (!first)
    return <p className="my-3 text-ink-2">An item has no result here, so that there is no whole total to vary.</p>;

  return (
    <FigureWithTable
      summary={`Change of the predicted total at ${point.operatingPoint}. The most: ${first.label}, ${changeText(first.lower, reading)} to ${changeText(first.higher, reading)}${reading.unit ? ` ${reading.unit}` : ""}.`}
      picture={<SensitivityPicture bars={bars} reading={reading} />}
      caption={`Change of the predicted total${inUnit(reading)}, the whole budget computed anew: hollow with one step less, solid with one step more. At the right the two in figures. The drag coefficient is that of bluff bodies and inside drag areas; every other input stays.${streamSentence(reading)}`}
      table={<SensitivityTable bars={bars} reading={reading} />}
    />
  );
}

/** A varied speed or temperature moves what a force is referred to; the drag alone is what is varied here. */
function streamSentence(reading: Reading): string {
  return isKept(reading) || reading.measure === "newtons"
    ? ""
    : " Every change is a change of drag, read by the stream of the operating point as it stands.";
}

function SensitivityTable({ bars, reading }: { bars: readonly SensitivityBar[]; reading: Reading }) {
  return (
    <Table caption={`Change of the predicted total${inUnit(reading)}`}>
      <TableHead>
        <Head>What moves</Head>
        <Head numeric>One step less</Head>
        <Head numeric>One step more</Head>
      </TableHead>
      <tbody>
        {bars.map(({ label, lower, higher }) => (
          <Row key={label}>
            <RowHead>
              <SymbolText symbol={label} />
            </RowHead>
            <Cell numeric>{changeText(lower, reading)}</Cell>
            <Cell numeric>{changeText(higher, reading)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

import { FigureWithTable } from "@/app/_components/figure-with-table";
import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatSignificant } from "@/lib/units/format-number";

import { powerOfTen } from "./axis";
import { type ChartPoint, type FrictionChart, frictionChart } from "./friction-chart";
import { frictionChartLayout } from "./friction-chart-layout";
import type { FrictionSubject } from "./friction-subject";
import { Plot } from "./plot";

interface FrictionChartFigureProps {
  subject: FrictionSubject;
  /** Which item it is of, where several stand side by side. */
  name: string;
}

/** Mean coefficient of friction over Re, with the item's own point. */
export function FrictionChartFigure({ subject, name }: FrictionChartFigureProps) {
  const chart = frictionChart(subject);
  const { own, smoothLine, roughLine, transitionReynolds } = chart;
  const { runUp } = subject.friction;

  return (
    <FigureWithTable
      summary={
        `Friction chart: mean coefficient of friction over Re. ${name} stands at Re ${formatSignificant(own.reynolds)} ` +
        `with ${formatSignificant(own.coefficient)}.`
      }
      picture={<Plot layout={frictionChartLayout(chart)} />}
      caption={
        <span>
          Mean coefficient over Re. Thick: this layer from its start; ring: the item. Solid: {smoothLine.title},
          turbulent from the start; dashed: laminar (Blasius, dotted beyond its range) and mixed, with transition at Re{" "}
          {formatSignificant(transitionReynolds)}; thin: rough surfaces of one <SymbolText symbol="L/k_s" />,{" "}
          {roughLine.title}.
          {runUp > 0 ? " The ring lies off the thick line: the run-up's friction is not the item's." : ""}
        </span>
      }
      table={<ChartTable chart={chart} name={name} />}
    />
  );
}

function ChartTable({ chart, name }: { chart: FrictionChart; name: string }) {
  const laminar = [...chart.laminar, ...chart.laminarBeyond];
  const rows = chart.turbulent.filter((_, at) => at % 6 === 0);

  return (
    <Table caption={`Mean coefficients of the friction chart; the last row is ${name}`}>
      <TableHead>
        <Head>Re</Head>
        <Head numeric>Laminar</Head>
        <Head numeric>Mixed</Head>
        <Head numeric>Turbulent</Head>
        {chart.family.map(({ lengthOverRoughness }) => (
          <Head key={lengthOverRoughness} numeric>
            <SymbolText symbol={`L/k_s ${powerOfTen(Math.round(Math.log10(lengthOverRoughness)))}`} />
          </Head>
        ))}
      </TableHead>
      <tbody>
        {rows.map(({ reynolds, coefficient }) => (
          <Row key={reynolds}>
            <RowHead>{formatSignificant(reynolds)}</RowHead>
            <Cell numeric>{interpolated(laminar, reynolds)}</Cell>
            <Cell numeric>{interpolated(chart.mixed, reynolds)}</Cell>
            <Cell numeric>{formatSignificant(coefficient)}</Cell>
            {chart.family.map(({ lengthOverRoughness, points }) => (
              <Cell key={lengthOverRoughness} numeric>
                {interpolated(points, reynolds)}
              </Cell>
            ))}
          </Row>
        ))}
        <Row band>
          <RowHead>{formatSignificant(chart.own.reynolds)}</RowHead>
          <Cell colSpan={3 + chart.family.length}>
            {name}: {formatSignificant(chart.own.coefficient)}
          </Cell>
        </Row>
      </tbody>
    </Table>
  );
}

/** The value of a curve at a Re; a dash where it is not drawn there. */
function interpolated(points: readonly ChartPoint[], reynolds: number): string {
  const after = points.findIndex((point) => point.reynolds >= reynolds * (1 - 1e-9));
  const [right, left] = [points[after], points[after - 1]];
  if (!right) return "–";
  if (!left) return right.reynolds <= reynolds * (1 + 1e-9) ? formatSignificant(right.coefficient) : "–";
  const part = Math.log(reynolds / left.reynolds) / Math.log(right.reynolds / left.reynolds);
  return formatSignificant(left.coefficient * (right.coefficient / left.coefficient) ** part);
}

import { FigureWithTable } from "@/app/_components/figure-with-table";
import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatResult, formatThickness } from "@/lib/units/format-quantity";
import { formatSignificant } from "@/lib/units/format-number";

import type { FrictionSubject } from "./friction-subject";
import { type LayerGrowth, layerGrowth, type LayerStation } from "./layer-growth";
import { growthLayout, shearLayout } from "./layer-layouts";
import { Plot } from "./plot";

interface LayerFigureProps {
  subject: FrictionSubject;
  /** Which item it is of, where several stand side by side. */
  name: string;
}

/** δ, δ* and θ along the layer. */
export function GrowthFigure({ subject, name }: LayerFigureProps) {
  const growth = layerGrowth(subject);
  const end = growth.stations.at(-1);
  if (!end) return null;

  return (
    <FigureWithTable
      summary={
        `Growth of the boundary layer of ${name}: at its end δ ${formatThickness(end.thickness)}, ` +
        `δ* ${formatThickness(end.displacementThickness)}, θ ${formatThickness(end.momentumThickness)}. ${regimeWords(growth)}`
      }
      picture={<Plot layout={growthLayout(growth)} />}
      caption={
        <span>
          Growth of the boundary layer from its start. Thick: δ; solid: δ*; dashed: θ. {regimeWords(growth)}
          {growth.runUp > 0 ? " Hatched: run-up, ahead of this item." : ""}
        </span>
      }
      table={
        <StationTable
          caption={`Boundary layer of ${name}`}
          subject={subject}
          columns={[
            { head: "δ", unit: "mm", value: ({ thickness }) => thickness * 1000 },
            { head: "δ*", unit: "mm", value: ({ displacementThickness }) => displacementThickness * 1000 },
            { head: "θ", unit: "mm", value: ({ momentumThickness }) => momentumThickness * 1000 },
          ]}
        />
      }
    />
  );
}

/** Wall shear stress along the layer. */
export function ShearFigure({ subject, name }: LayerFigureProps) {
  const growth = layerGrowth(subject);
  const end = growth.stations.at(-1);
  if (!end) return null;

  return (
    <FigureWithTable
      summary={
        `Wall shear stress along ${name}: ${formatResult(end.wallShearStress, "Pa")} at its end. ` + regimeWords(growth)
      }
      picture={<Plot layout={shearLayout(growth)} />}
      caption={
        <span>
          Wall shear stress <SymbolText symbol="τ_w" /> along the layer; it has no bound at the very start.{" "}
          {regimeWords(growth)}
        </span>
      }
      table={
        <StationTable
          caption={`Wall shear stress along ${name}`}
          subject={subject}
          columns={[{ head: "τ_w", unit: "Pa", value: ({ wallShearStress }) => wallShearStress }]}
        />
      }
    />
  );
}

function regimeWords({ transitionAt, end }: LayerGrowth): string {
  if (transitionAt === null) return `Laminar over all ${formatResult(end, "m")}.`;
  if (transitionAt === 0) return "Turbulent from its start.";
  return `Laminar to ${formatResult(transitionAt, "m")}, turbulent beyond.`;
}

interface StationTableProps {
  caption: string;
  subject: FrictionSubject;
  columns: readonly { head: string; unit: string; value: (station: LayerStation) => number }[];
}

const STATIONS_OF_TABLE = 11;

function StationTable({ caption, subject, columns }: StationTableProps) {
  return (
    <Table caption={`${caption}, by the distance from the start of the layer`}>
      <TableHead>
        <Head unit="m">x</Head>
        <Head>Regime</Head>
        {columns.map(({ head, unit }) => (
          <Head key={head} numeric unit={unit}>
            <SymbolText symbol={head} />
          </Head>
        ))}
      </TableHead>
      <tbody>
        {layerGrowth(subject, STATIONS_OF_TABLE).stations.map((station) => (
          <Row key={station.place}>
            <RowHead>{formatSignificant(station.place)}</RowHead>
            <Cell>{station.regime}</Cell>
            {columns.map(({ head, value }) => (
              <Cell key={head} numeric>
                {formatSignificant(value(station))}
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

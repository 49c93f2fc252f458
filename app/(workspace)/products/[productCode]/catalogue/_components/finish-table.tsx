import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { LineOf, LineState } from "@/lib/evaluation/lines/line-state";
import { formatQuantityNumber } from "@/lib/units/format-quantity";
import type { UnitSystem } from "@/lib/units/us-customary";

import { InUsUnits } from "./in-us-units";

interface FinishTableProps {
  lines: readonly LineState[];
  units: UnitSystem;
}

/** The finishes that items may name, with their equivalent sand-grain roughness and where it comes from. */
export function FinishTable({ lines, units }: FinishTableProps) {
  const finishes = lines.filter((line): line is LineOf<"finish"> => line.kind === "finish");

  if (finishes.length === 0) return <p className="text-ink-2">None: every item types its own roughness.</p>;

  return (
    <Table caption="Finishes" narrow="stack">
      <TableHead>
        <Head>Finish</Head>
        <Head numeric unit="µm">
          k<sub>s</sub>
        </Head>
        <Head>Rev</Head>
        <Head>Source</Head>
      </TableHead>
      <tbody>
        {finishes.map(({ number, letter, retired, body }) => (
          <Row key={number}>
            <RowHead label="Finish">
              <span className="mr-1.5 text-ink-2">{number}</span>
              {body.name}
              {retired ? <span className="ml-2 text-xs text-ink-2">retired</span> : null}
            </RowHead>
            <Cell numeric label="k_s, µm">
              {formatQuantityNumber(body.roughness.value, "roughness")}
              <InUsUnits value={body.roughness.value} dimension="roughness" units={units} />
            </Cell>
            <Cell label="Rev">
              <RevisionLetter letter={letter} />
            </Cell>
            <Cell label="Source" className="text-sm text-ink-2">
              {body.source}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

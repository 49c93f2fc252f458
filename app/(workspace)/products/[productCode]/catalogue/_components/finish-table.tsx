import type { Route } from "next";
import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { itemsOfFinish } from "@/lib/evaluation/budget/touches";
import type { LineOf, LineState } from "@/lib/evaluation/lines/line-state";
import { formatQuantityNumber } from "@/lib/units/format-quantity";
import type { UnitSystem } from "@/lib/units/us-customary";

import { InUsUnits } from "@/app/(workspace)/products/[productCode]/_components/in-us-units";

interface FinishTableProps {
  lines: readonly LineState[];
  units: UnitSystem;
  hrefOf: (finish: string) => string;
}

/** The finishes that items may name: equivalent sand-grain roughness, where it comes from, and who has it. */
export function FinishTable({ lines, units, hrefOf }: FinishTableProps) {
  const finishes = lines
    .filter((line): line is LineOf<"finish"> => line.kind === "finish")
    .sort(({ number: one }, { number: other }) => one.length - other.length || (one < other ? -1 : 1));

  if (finishes.length === 0) {
    return <EmptyNote title="No finishes.">Every item types its own roughness.</EmptyNote>;
  }

  return (
    <Table caption="Finishes" narrow="stack">
      <TableHead>
        <Head className="w-[26%]">Finish</Head>
        <Head numeric unit="µm">
          k<sub>s</sub>
        </Head>
        <Head>Rev</Head>
        <Head>Since issue</Head>
        <Head>Source</Head>
        <Head>Items that have it</Head>
      </TableHead>
      <tbody>
        {finishes.map((finish) => (
          <FinishRow
            key={finish.number}
            finish={finish}
            items={itemsOfFinish(lines, finish.number)}
            units={units}
            href={hrefOf(finish.number)}
          />
        ))}
      </tbody>
    </Table>
  );
}

interface FinishRowProps {
  finish: LineOf<"finish">;
  items: readonly string[];
  units: UnitSystem;
  href: string;
}

function FinishRow({ finish: { number, letter, issue, retired, body }, items, units, href }: FinishRowProps) {
  return (
    <Row data-finish={number}>
      <RowHead label="Finish">
        <Link href={href as Route} className="link">
          <span className="mr-1.5">{number}</span>
          {body.name}
        </Link>
        {retired ? <span className="ml-2 text-xs text-ink-2">retired</span> : null}
      </RowHead>
      <Cell numeric label="k_s, µm">
        {formatQuantityNumber(body.roughness.value, "roughness")}
        <InUsUnits value={body.roughness.value} dimension="roughness" units={units} />
      </Cell>
      <Cell label="Rev">
        <RevisionLetter letter={letter} />
      </Cell>
      <Cell label="Since issue">{issue}</Cell>
      <Cell label="Source" className="text-sm text-ink-2">
        {body.source}
      </Cell>
      <Cell label="Items">{items.length === 0 ? <span className="text-ink-2">none</span> : items.join(", ")}</Cell>
    </Row>
  );
}

import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";
import { ShareBar } from "@/app/(workspace)/products/[productCode]/_pictures/share-bar";
import type { CauseRow } from "@/app/(workspace)/products/[productCode]/_uncertainty/cause-rows";

interface CausesTableProps {
  rows: readonly CauseRow[];
  others: PointUncertainty["otherCauses"];
}

/** What the total is uncertain by, the greatest first: a bar to scale for each, and the numbers beside it. */
export function CausesTable({ rows, others }: CausesTableProps) {
  return (
    <>
      <p className="mb-2 text-sm text-ink-2">
        Solid: the standard uncertainty has a source. Hatched: it is a judgement. A bar over the whole width would be
        all of the variance.
      </p>
      <Table caption="Share of the variance of ΣB by cause" narrow="stack">
        <TableHead>
          <Head>Cause</Head>
          <Head>Value, standard uncertainty</Head>
          <Head>Source or judgement</Head>
          <Head numeric unit="N">
            Effect on ΣB
          </Head>
          <Head numeric unit="of the variance">
            Share
          </Head>
          <Head className="w-1/4">To scale</Head>
        </TableHead>
        <tbody>
          {rows.map((row) => (
            <CauseTableRow key={row.key} row={row} />
          ))}
          <OtherCauses others={others} />
        </tbody>
      </Table>
    </>
  );
}

function CauseTableRow({ row }: { row: CauseRow }) {
  const { key, what, where, symbol, value, standardUncertainty, newtons, share, basis } = row;

  return (
    <Row data-cause={key}>
      <RowHead label="Cause">
        {what} <SymbolText symbol={symbol} />
        <span className="block text-xs text-ink-2">{where}</span>
      </RowHead>
      <Cell label="Value, u">
        {value === null ? "" : `${value} `}± {standardUncertainty}
      </Cell>
      <Cell label={basis.kind === "source" ? "Source" : "Judgement"} className="max-w-80 text-sm">
        <span className="font-medium max-sm:hidden">{basis.kind === "source" ? "Source: " : "Judgement: "}</span>
        {basis.text}
      </Cell>
      <Cell numeric label="Effect, N">
        <WorkingNumber figure="standardUncertainty" of="cause" number={key} name={`Effect of ${what}, ${where}`}>
          {formatSignificant(newtons)}
        </WorkingNumber>
      </Cell>
      <Cell numeric label="Share">
        <WorkingNumber figure="standardUncertainty" of="cause" number={key} name={`Share of ${what}, ${where}`}>
          {formatPercent(share, 1)}
        </WorkingNumber>
      </Cell>
      <Cell label="To scale">
        <ShareBar share={share} hatched={basis.kind === "judgement"} />
      </Cell>
    </Row>
  );
}

function OtherCauses({ others: { count, share } }: Pick<CausesTableProps, "others">) {
  if (count === 0) return null;

  return (
    <Row>
      <RowHead label="Cause">
        {count} {count === 1 ? "further cause" : "further causes"}
        <span className="block text-xs text-ink-2">less than 0.1 % each</span>
      </RowHead>
      <Cell className="max-sm:hidden!" />
      <Cell className="max-sm:hidden!" />
      <Cell className="max-sm:hidden!" />
      <Cell numeric label="Share">
        {formatPercent(share, 1)}
      </Cell>
      <Cell className="max-sm:hidden!" />
    </Row>
  );
}

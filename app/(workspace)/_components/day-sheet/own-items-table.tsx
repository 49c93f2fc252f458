import type { Route } from "next";
import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { NoteMark } from "@/app/_components/note-mark";
import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatHundredths, formatNewtonsChange, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { toHundredths } from "@/lib/units/rounding";
import type { DaySheetItem } from "@/lib/proposals/workspace-views";

/** Where the items stand that the reader owns, each at the point named. */
export function OwnItemsTable({ items }: { items: readonly DaySheetItem[] }) {
  if (items.length === 0) {
    return <EmptyNote title="You own no items.">Items that you will own are added by a proposal.</EmptyNote>;
  }

  return (
    <Table caption="Your items" narrow="stack">
      <TableHead>
        <Head>Item</Head>
        <Head>Rev</Head>
        <Head>At</Head>
        <Head numeric unit="N">
          Predicted
        </Head>
        <Head numeric unit="N">
          Allocation
        </Head>
        <Head numeric unit="N">
          Margin
        </Head>
        <Head>Since you last looked</Head>
      </TableHead>
      <tbody>
        {items.map((item) => (
          <OwnItemRow key={`${item.productCode} ${item.number}`} item={item} />
        ))}
      </tbody>
    </Table>
  );
}

function OwnItemRow({ item }: { item: DaySheetItem }) {
  const { productCode, number, predicted, allocationHundredths, over, cautions } = item;

  return (
    <Row>
      <RowHead label="Item">
        <Link className="link" href={`/products/${productCode}/items/${number}` as Route}>
          {productCode} {number}
        </Link>{" "}
        {item.name}
        {cautions > 0 ? (
          <NoteMark severity="caution">{cautions === 1 ? "1 caution" : `${cautions} cautions`}</NoteMark>
        ) : null}
      </RowHead>
      <Cell label="Rev">
        <RevisionLetter letter={item.letter} />
      </Cell>
      <Cell label="At">{item.operatingPoint}</Cell>
      <Cell numeric label="Predicted">
        {predicted === null ? "not computed" : formatNewtonsNumber(predicted)}
      </Cell>
      <Cell numeric label="Allocation">
        {allocationHundredths === null ? "none" : formatHundredths(allocationHundredths)}
      </Cell>
      <Cell numeric label="Margin" className={over ? "font-semibold text-signal" : ""}>
        {predicted === null || allocationHundredths === null
          ? "–"
          : formatHundredths(allocationHundredths - toHundredths(predicted))}
        {over ? " over" : ""}
      </Cell>
      <Cell label="Since">
        <Since item={item} />
      </Cell>
    </Row>
  );
}

/** What became of an item between the last visit and today. */
function Since({ item: { since, letter } }: { item: DaySheetItem }) {
  if (since === null) return <span className="text-ink-2">unchanged</span>;
  if (since.letterWas === null) return <>new</>;
  const { letterWas, predictedDelta, allocationDelta } = since;

  return (
    <>
      {letterWas === letter ? null : (
        <span className="block">
          <RevisionLetter letter={letterWas} /> became <RevisionLetter letter={letter} />
        </span>
      )}
      {predictedDelta === null || toHundredths(predictedDelta) === 0 ? null : (
        <span className="block">predicted {formatNewtonsChange(predictedDelta)}</span>
      )}
      {allocationDelta === null || toHundredths(allocationDelta) === 0 ? null : (
        <span className="block">allocation {formatNewtonsChange(allocationDelta)}</span>
      )}
    </>
  );
}

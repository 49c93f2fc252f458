import type { Route } from "next";
import Link from "next/link";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Row, RowHead } from "@/app/_components/table";
import type { Reading } from "@/lib/evaluation/measures/reading";

import type { ShownRow } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";
import { sheetAddress } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-address";
import type { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { FigureCells } from "./figure-cells";
import type { RowPlace } from "./row-place";

interface GroupTableRowProps {
  place: RowPlace;
  row: Extract<ShownRow, { kind: "group" }>;
  isReference: boolean;
  path: string;
  query: SheetQuery;
  reading: Reading;
}

/** A group ahead of what it holds: sums over it and its subgroups. */
export function GroupTableRow({ place, row, isReference, path, query, reading }: GroupTableRowProps) {
  const { number, name, letter, depth, members } = row;
  const isClosed = query.closed.includes(number);
  const others = query.closed.filter((each) => each !== number);
  const toggled = sheetAddress(path, query, { closed: isClosed ? others : [...others, number].sort() });

  return (
    <Row band {...place} id={`group-${number}`} data-group={number}>
      <RowHead className="font-semibold">
        <span className="block" style={{ paddingLeft: `${depth * 0.9}rem` }}>
          <Link href={toggled as Route} scroll={false} aria-expanded={!isClosed} className="hover:underline">
            <span aria-hidden className="mr-1 inline-block w-3 font-normal text-ink-2 print:hidden">
              {isClosed ? "+" : "−"}
            </span>
            <span className="mr-1.5 font-normal text-ink-2">{number}</span>
            {name}
          </Link>
        </span>
      </RowHead>
      <Cell className="text-xs font-normal text-ink-2 max-sm:hidden">
        {members === 0 ? "no items yet" : `${members} ${members === 1 ? "item" : "items"}`}
      </Cell>
      <Cell className="font-normal">
        <RevisionLetter letter={letter} />
      </Cell>
      <FigureCells row={row} isReference={isReference} reading={reading} />
    </Row>
  );
}

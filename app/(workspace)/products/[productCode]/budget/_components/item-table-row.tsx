import type { Route } from "next";
import Link from "next/link";
import { Fragment } from "react";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Row, RowHead } from "@/app/_components/table";
import type { Reading } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";

import type { ShownItem } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";
import { FigureCells } from "./figure-cells";
import { NoteCount, RowNotes } from "./row-notes";
import type { RowPlace } from "./row-place";

interface ItemTableRowProps {
  place: RowPlace;
  row: ShownItem;
  /** Name of the method. */
  method: string;
  isReference: boolean;
  href: string;
  reading: Reading;
  units: UnitSystem;
}

/** An item on the budget sheet. */
export function ItemTableRow({ place, row, method, isReference, href, reading, units }: ItemTableRowProps) {
  const { number, name, owner, letter, depth, saving, figures, notes } = row;

  return (
    <Row {...place} id={`item-${number}`} data-item={number}>
      <RowHead>
        <span className="block" style={{ paddingLeft: `${depth * 0.9}rem` }}>
          <Link href={href as Route} className="hover:underline">
            <span className="mr-1.5 text-ink-2">{number}</span>
            {name}
          </Link>
          <span className="block text-xs text-ink-2">
            {owner}
            {saving ? " · a saving" : ""}
          </span>
          <span className="block sm:hidden">
            <NoteCount notes={notes} />
          </span>
        </span>
      </RowHead>
      <Cell className="min-w-44 max-sm:hidden lg:max-w-64">
        {method}
        <span className="block text-xs text-ink-2">
          {figures[units].map(({ symbol, text }, at, all) => (
            <Fragment key={symbol}>
              <span className="whitespace-nowrap">
                <SymbolText symbol={symbol} /> {text}
                {at < all.length - 1 ? " ·" : ""}
              </span>{" "}
            </Fragment>
          ))}
        </span>
        <RowNotes notes={notes} />
      </Cell>
      <Cell>
        <RevisionLetter letter={letter} />
      </Cell>
      <FigureCells row={row} isReference={isReference} reading={reading} />
    </Row>
  );
}

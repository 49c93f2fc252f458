import type { Route } from "next";
import Link from "next/link";
import { Fragment } from "react";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Row, RowHead } from "@/app/_components/table";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { Reading } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";

import type { ItemRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { keyFigures } from "@/app/(workspace)/products/[productCode]/_sheet/key-figures";
import { FigureCells } from "./figure-cells";
import { NoteCount, RowNotes } from "./row-notes";

interface ItemTableRowProps {
  row: ItemRow;
  isReference: boolean;
  href: string;
  reading: Reading;
  units: UnitSystem;
}

/** An item on the budget sheet. */
export function ItemTableRow({ row, isReference, href, reading, units }: ItemTableRowProps) {
  const { number, name, owner, letter, depth, body, result } = row;

  return (
    <Row data-item={number}>
      <RowHead>
        <span className="block" style={{ paddingLeft: `${depth * 0.9}rem` }}>
          <Link href={href as Route} className="hover:underline">
            <span className="mr-1.5 text-ink-2">{number}</span>
            {name}
          </Link>
          <span className="block text-xs text-ink-2">
            {owner}
            {body.saving ? " · a saving" : ""}
          </span>
          <span className="block sm:hidden">
            <NoteCount notes={result.notes} />
          </span>
        </span>
      </RowHead>
      <Cell className="min-w-44 max-sm:hidden lg:max-w-64">
        {ITEM_METHODS[body.method].label}
        <span className="block text-xs text-ink-2">
          {keyFigures(body, result.answer, units).map(({ symbol, text }, at, all) => (
            <Fragment key={symbol}>
              <span className="whitespace-nowrap">
                <SymbolText symbol={symbol} /> {text}
                {at < all.length - 1 ? " ·" : ""}
              </span>{" "}
            </Fragment>
          ))}
        </span>
        <RowNotes notes={result.notes} />
      </Cell>
      <Cell>
        <RevisionLetter letter={letter} />
      </Cell>
      <FigureCells row={row} isReference={isReference} reading={reading} />
    </Row>
  );
}

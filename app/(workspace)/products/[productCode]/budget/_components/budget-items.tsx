import { EmptyNote } from "@/app/_components/empty-note";
import type { SheetAt } from "@/lib/budget/sheet-at";
import type { SheetPoint } from "@/lib/budget/sheet-data";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { Reading } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";

import { chosenRows, shownRows } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";
import type { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { BudgetTable } from "./budget-table";
import { FilterForm } from "./filter-form";
import { FIRST_ROWS, MOST_ROWS } from "./row-window";

interface BudgetItemsProps {
  found: SheetAt;
  point: SheetPoint;
  query: SheetQuery;
  userId: number;
  reading: Reading;
  units: UnitSystem;
}

/** The items of the sheet, or what to do first where there are none. Of a long list the first screen, the rest follows. */
export function BudgetItems({ found, point, query, userId, reading, units }: BudgetItemsProps) {
  const { product, sheet, people } = found;
  const path = `/products/${product.code}/budget`;
  const all = countItems(sheet.rows);
  if (all === 0 && sheet.rows.length === 0) {
    return (
      <EmptyNote title="No items yet.">
        Whoever will own an item starts a proposal that adds it; once it is signed it stands here with its numbers.
      </EmptyNote>
    );
  }

  const isReference = sheet.referencePoint === sheet.operatingPoint;
  const rows = chosenRows(shownRows(sheet.rows, people), query, { userId, isReference });
  const isLong = rows.length > MOST_ROWS;
  const shown = chosenRows(shownRows(sheet.rows, people), { ...query, closed: [] }, { userId, isReference });
  return (
    <>
      <FilterForm path={path} query={query} found={countItems(shown)} all={all} isReference={isReference} />
      {rows.length === 0 ? (
        <EmptyNote title="No item is like that.">Ask for fewer words, or show all items again.</EmptyNote>
      ) : (
        <BudgetTable
          key={`${sheet.issue} ${sheet.operatingPoint}`}
          product={product.code}
          issue={sheet.issue}
          point={point}
          rows={isLong ? rows.slice(0, FIRST_ROWS) : rows}
          count={rows.length}
          people={isLong ? people : []}
          reader={{ userId, isReference }}
          methods={METHOD_NAMES}
          query={query}
          reading={reading}
          units={units}
        />
      )}
    </>
  );
}

/** The page that works in the browser gets the names only, not what a method is made of. */
const METHOD_NAMES = Object.fromEntries(Object.entries(ITEM_METHODS).map(([method, { label }]) => [method, label]));

function countItems(rows: readonly { kind: string }[]): number {
  return rows.filter(({ kind }) => kind === "item").length;
}

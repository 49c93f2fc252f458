import { EmptyNote } from "@/app/_components/empty-note";
import type { Reading } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";

import type { BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { chosenRows, type SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { BudgetTable } from "./budget-table";
import { FilterForm } from "./filter-form";

interface BudgetItemsProps {
  sheet: BudgetSheet;
  query: SheetQuery;
  path: string;
  userId: number;
  reading: Reading;
  units: UnitSystem;
}

/** The items of the sheet, or what to do first where there are none. */
export function BudgetItems({ sheet, query, path, userId, reading, units }: BudgetItemsProps) {
  const all = countItems(sheet.rows);
  if (all === 0 && sheet.rows.length === 0) {
    return (
      <EmptyNote title="No items yet.">
        Whoever will own an item starts a proposal that adds it; once it is signed it stands here with its numbers.
      </EmptyNote>
    );
  }

  const rows = chosenRows(sheet, query, userId);
  return (
    <>
      <FilterForm path={path} query={query} found={countItems(rows)} all={all} isReference={sheet.isReference} />
      {rows.length === 0 ? (
        <EmptyNote title="No item is like that.">Ask for fewer words, or show all items again.</EmptyNote>
      ) : (
        <BudgetTable sheet={sheet} rows={rows} path={path} query={query} reading={reading} units={units} />
      )}
    </>
  );
}

function countItems(rows: readonly { kind: string }[]): number {
  return rows.filter(({ kind }) => kind === "item").length;
}

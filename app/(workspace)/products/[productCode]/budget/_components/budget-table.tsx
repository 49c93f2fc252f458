import { Head, Table, TableHead } from "@/app/_components/table";
import type { Reading } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";

import type { BudgetRow, BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import {
  sheetAddress,
  type SheetQuery,
  type SortKey,
} from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { GroupTableRow } from "./group-table-row";
import { ItemTableRow } from "./item-table-row";
import { TotalRows } from "./total-rows";

interface BudgetTableProps {
  sheet: BudgetSheet;
  rows: readonly BudgetRow[];
  path: string;
  query: SheetQuery;
  reading: Reading;
  units: UnitSystem;
}

/** Items and groups with their numbers; every number opens its working. */
export function BudgetTable({ sheet, rows, path, query, reading, units }: BudgetTableProps) {
  const { product } = sheet.budget;
  const itemHref = (number: string) => itemAddress(product.code, number, query);

  return (
    <Table
      caption={`Items at ${sheet.point.operatingPoint} ${sheet.point.name}${reading.basis ? `; ${reading.basis}` : ""}`}
    >
      <TableHead>
        <Head className="min-w-36 lg:min-w-48" {...sorting("number", path, query)}>
          Item
        </Head>
        <Head className="max-sm:hidden">Method</Head>
        <Head>Rev</Head>
        {COLUMNS.map(({ key, label }) => (
          <Head key={key} numeric unit={reading.unit} {...sorting(key, path, query)}>
            {label}
          </Head>
        ))}
        <Head className="max-sm:hidden">Against allocation</Head>
      </TableHead>
      <tbody>
        {rows.map((row) =>
          row.kind === "item" ? (
            <ItemTableRow
              key={`item ${row.number}`}
              row={row}
              isReference={sheet.isReference}
              href={itemHref(row.number)}
              reading={reading}
              units={units}
            />
          ) : (
            <GroupTableRow key={`group ${row.number}`} row={row} isReference={sheet.isReference} reading={reading} />
          ),
        )}
      </tbody>
      <tfoot>
        <TotalRows point={sheet.point} reading={reading} />
      </tfoot>
    </Table>
  );
}

const COLUMNS: readonly { key: SortKey; label: string }[] = [
  { key: "basic", label: "Basic" },
  { key: "growth", label: "Growth" },
  { key: "predicted", label: "Predicted" },
  { key: "allocation", label: "Allocation" },
  { key: "margin", label: "Margin" },
];

/** First up, then down, then the order of the sheet again. */
function sorting(key: SortKey, path: string, query: SheetQuery) {
  const isSorted = query.sort === key;
  const isDown = query.down !== undefined;
  const next: Partial<SheetQuery> = !isSorted
    ? { sort: key, down: undefined }
    : isDown
      ? { sort: "sheet", down: undefined }
      : { sort: key, down: "1" };
  return {
    sortHref: sheetAddress(path, query, next),
    sorted: isSorted ? (isDown ? ("descending" as const) : ("ascending" as const)) : undefined,
  };
}

function itemAddress(productCode: string, number: string, { issue, point, measure }: SheetQuery): string {
  const parts = new URLSearchParams();
  if (issue !== undefined) parts.set("issue", String(issue));
  if (point !== undefined) parts.set("point", point);
  if (measure !== undefined) parts.set("measure", measure);
  const query = parts.toString();
  return `/products/${productCode}/items/${number}${query === "" ? "" : `?${query}`}`;
}

import { Head, TableHead } from "@/app/_components/table";

import { sheetAddress } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-address";
import type { SheetQuery, SortKey } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";

interface BudgetTableHeadProps {
  path: string;
  query: SheetQuery;
  unit: string;
}

/** The columns; a heading sorts by its column. */
export function BudgetTableHead({ path, query, unit }: BudgetTableHeadProps) {
  return (
    <TableHead>
      <Head className="min-w-36 lg:min-w-48" {...sorting("number", path, query)}>
        Item
      </Head>
      <Head className="max-sm:hidden">Method</Head>
      <Head>Rev</Head>
      {COLUMNS.map(({ key, label }) => (
        <Head key={key} numeric unit={unit} {...sorting(key, path, query)}>
          {label}
        </Head>
      ))}
      <Head className="max-sm:hidden">Against allocation</Head>
    </TableHead>
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

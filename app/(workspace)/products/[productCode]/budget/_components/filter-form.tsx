import type { Route } from "next";
import Link from "next/link";

import { Button } from "@/app/_components/button";

import { sheetAddress } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-address";
import type { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";

interface FilterFormProps {
  path: string;
  query: SheetQuery;
  found: number;
  all: number;
  /** Over is said only where allocations are set. */
  isReference: boolean;
}

/** Finds rows by number, name or owner; what is asked stands in the address, so that it can be sent on. */
export function FilterForm({ path, query, found, all, isReference }: FilterFormProps) {
  const choices = ONLY.filter(({ value }) => value !== "over" || isReference);

  return (
    <form action={path} className="mt-6 mb-2 flex flex-wrap items-end gap-x-4 gap-y-2 print:hidden" role="search">
      {KEPT.map((key) => {
        const value = key === "closed" ? query.closed.join(",") : query[key];
        return value === undefined || value === "sheet" || value === "" ? null : (
          <input key={key} type="hidden" name={key} value={value} />
        );
      })}
      <label className="text-sm">
        <span className="mb-1 block font-medium">Find an item</span>
        <input
          type="search"
          name="find"
          defaultValue={query.find}
          placeholder="number, name or owner"
          className="min-h-9 w-56 rounded-edge border border-ink-2 bg-sheet px-2.5 py-1.5 text-base"
        />
      </label>
      <label className="text-sm">
        <span className="mb-1 block font-medium">Show</span>
        <select
          name="only"
          defaultValue={query.only}
          className="min-h-9 rounded-edge border border-ink-2 bg-sheet px-2 py-1.5 text-base"
        >
          {choices.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </select>
      </label>
      <Button type="submit">Show</Button>
      <p role="status" className="py-2 text-sm text-ink-2">
        {found === all ? `${all} ${all === 1 ? "item" : "items"}` : `${found} of ${all} items`}
        {found === all ? null : (
          <Link className="link ml-3" href={sheetAddress(path, query, { find: "", only: "all" }) as Route}>
            Show all
          </Link>
        )}
      </p>
    </form>
  );
}

const KEPT = ["issue", "on", "point", "measure", "sort", "down", "closed"] as const;

const ONLY = [
  { value: "all", label: "all items" },
  { value: "over", label: "over their allocation" },
  { value: "cautions", label: "with a caution or a refusal" },
  { value: "mine", label: "owned by me" },
];

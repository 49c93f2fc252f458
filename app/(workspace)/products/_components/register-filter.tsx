import type { Route } from "next";
import Link from "next/link";

import { Button } from "@/app/_components/button";

import { registerAddress, type RegisterQuery } from "../_register/register-rows";

const CONTROL = "min-h-9 rounded-edge border border-ink-2 bg-sheet px-2.5 py-1.5 text-base";

interface RegisterFilterProps {
  query: RegisterQuery;
  found: number;
  all: number;
}

/** Finds products by code or name and by what is the matter with them; the question stands in the address. */
export function RegisterFilter({ query, found, all }: RegisterFilterProps) {
  return (
    <form action="/products" className="mb-2 flex flex-wrap items-end gap-x-4 gap-y-2 print:hidden" role="search">
      {(["measure", "sort", "down"] as const).map((key) => {
        const value = query[key];
        return value === undefined || value === "code" ? null : (
          <input key={key} type="hidden" name={key} value={value} />
        );
      })}
      <label className="text-sm">
        <span className="mb-1 block font-medium">Find a product</span>
        <input
          type="search"
          name="find"
          defaultValue={query.find}
          placeholder="code or name"
          className={`${CONTROL} w-56`}
        />
      </label>
      <label className="text-sm">
        <span className="mb-1 block font-medium">Show</span>
        <select name="only" defaultValue={query.only} className={CONTROL}>
          {ONLY.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </select>
      </label>
      <Button type="submit">Show</Button>
      <p role="status" className="py-2 text-sm text-ink-2">
        {found === all ? `${all} ${all === 1 ? "product" : "products"}` : `${found} of ${all} products`}
        {found === all ? null : (
          <Link className="link ml-3" href={registerAddress(query, { find: "", only: "all" }) as Route}>
            Show all
          </Link>
        )}
      </p>
    </form>
  );
}

const ONLY: readonly { value: RegisterQuery["only"]; label: string }[] = [
  { value: "all", label: "all products" },
  { value: "waiting", label: "where something waits for me" },
  { value: "open", label: "with open proposals" },
  { value: "into_the_reserve", label: "into the reserve" },
  { value: "over", label: "over the limit" },
  { value: "not_established", label: "not established" },
];

import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";

import { Button } from "@/app/_components/button";
import { ACT_NAMES } from "@/lib/vocabulary/acts";

import type { HistoryQuery } from "./history-query";

const CONTROL = "min-h-9 max-w-56 rounded-edge border border-ink-2 bg-sheet px-2 py-1.5 text-base";

interface HistoryFilterProps {
  path: string;
  query: HistoryQuery;
  persons: readonly { id: number; name: string }[];
  acts: readonly string[];
  total: number;
}

/** Asks the history for a person, an act, an outcome, days; the question stands in the address. */
export function HistoryFilter({ path, query, persons, acts, total }: HistoryFilterProps) {
  const asked = Object.entries(query).some(([key, value]) => key !== "page" && value !== undefined);

  return (
    <form action={path} className="mb-3 flex flex-wrap items-end gap-x-3 gap-y-2 print:hidden" role="search">
      <Choice label="Person" name="person" value={query.person}>
        {persons.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </Choice>
      <Choice label="Act" name="act" value={query.act}>
        {acts.map((act) => (
          <option key={act} value={act}>
            {Object.entries(ACT_NAMES).find(([key]) => key === act)?.[1] ?? act}
          </option>
        ))}
      </Choice>
      <Choice label="Outcome" name="outcome" value={query.outcome}>
        <option value="done">done</option>
        <option value="refused">refused</option>
      </Choice>
      <Day label="From" name="from" value={query.from} />
      <Day label="Until" name="until" value={query.until} />
      <Button type="submit">Show</Button>
      <p role="status" className="py-2 text-sm text-ink-2">
        {total} {total === 1 ? "entry" : "entries"}
        {asked ? (
          <Link className="link ml-3" href={path as Route}>
            Show all
          </Link>
        ) : null}
      </p>
    </form>
  );
}

interface ChoiceProps {
  label: string;
  name: string;
  value: string | number | undefined;
  children: ReactNode;
}

function Choice({ label, name, value, children }: ChoiceProps) {
  return (
    <label className="text-sm">
      <span className="mb-1 block font-medium">{label}</span>
      <select name={name} defaultValue={value ?? ""} className={CONTROL}>
        <option value="">any</option>
        {children}
      </select>
    </label>
  );
}

function Day({ label, name, value }: { label: string; name: string; value: string | undefined }) {
  return (
    <label className="text-sm">
      <span className="mb-1 block font-medium">{label}</span>
      <input type="date" name={name} defaultValue={value} className={CONTROL} />
    </label>
  );
}

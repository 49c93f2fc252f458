"use client";

import type { Route } from "next";
import Link from "next/link";
import { usePathname } from "next/navigation";
import { useEffect, useRef } from "react";

import { PendingMark } from "./pending-mark";

export interface SheetIndexEntry {
  href: string;
  label: string;
  /** Stands in plain brackets behind the name; left out when there is nothing to count. */
  count?: number;
}

interface SheetIndexProps {
  entries: readonly SheetIndexEntry[];
  label?: string;
}

/** The numbered index of sheets at the left of a page, as in a drawing set; a row to scroll on a narrow screen. */
export function SheetIndex({ entries, label = "Sheets" }: SheetIndexProps) {
  const current = currentEntry(entries, usePathname());
  const row = useRef<HTMLOListElement>(null);

  // On a narrow screen the row scrolls by itself to where one is.
  useEffect(() => {
    const place = row.current?.querySelector<HTMLElement>("[aria-current=page]")?.parentElement;
    if (place && row.current) row.current.scrollLeft = place.offsetLeft - row.current.offsetLeft;
  }, [current?.href]);

  return (
    <nav aria-label={label} className="print:hidden">
      <ol ref={row} className="flex overflow-x-auto border-t-[3px] border-ink lg:block lg:overflow-visible">
        {entries.map((entry, at) => (
          <li key={entry.href} className="shrink-0">
            <Link
              href={entry.href as Route}
              aria-current={entry === current ? "page" : undefined}
              className="flex items-baseline gap-2 border-b border-rule py-2.5 pr-3 pl-2 whitespace-nowrap hover:bg-band focus-visible:-outline-offset-2 aria-[current=page]:border-b-[3px] aria-[current=page]:border-b-ink aria-[current=page]:font-semibold lg:aria-[current=page]:border-b lg:aria-[current=page]:border-b-rule lg:aria-[current=page]:border-l-4 lg:aria-[current=page]:border-l-ink"
            >
              <span className="w-5 text-sm text-ink-2">{at + 1}</span>
              <span className="lg:grow">
                {entry.label}
                <PendingMark />
              </span>
              {entry.count ? <span className="text-sm font-normal text-ink-2">({entry.count})</span> : null}
            </Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}

/** The deepest entry whose address the page lies under. */
function currentEntry(entries: readonly SheetIndexEntry[], pathname: string): SheetIndexEntry | undefined {
  return entries
    .filter(({ href }) => pathname === href || pathname.startsWith(`${href}/`))
    .toSorted((one, other) => other.href.length - one.href.length)[0];
}

import { useMemo } from "react";
import useSWRImmutable from "swr/immutable";

import type { SheetData, SheetPoint } from "@/lib/budget/sheet-data";
import type { PersonName } from "@/lib/budget/views";

import {
  chosenRows,
  type Reader,
  type ShownRow,
  shownRows,
} from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";
import type { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";

interface SheetRowsAsked {
  product: string;
  issue: number;
  point: SheetPoint;
  /** What the server sent: all rows, or the first ones. */
  rows: readonly ShownRow[];
  count: number;
  people: readonly PersonName[];
  reader: Reader;
  query: SheetQuery;
}

export interface SheetRows {
  rows: readonly ShownRow[];
  keys: readonly string[];
  problem: string | null;
}

/** The rows of the table: what the server sent, and of a long list all of them, as soon as the kept sheet was read. */
export function useSheetRows(asked: SheetRowsAsked): SheetRows {
  const { product, issue, point, rows: first, count, people, reader, query } = asked;
  const isLong = first.length < count;
  const address = `/api/products/${product}/budget?${new URLSearchParams({ issue: String(issue), point: point.operatingPoint })}`;
  const { data, error } = useSWRImmutable(isLong ? address : null, readSheet);
  const all = useMemo(() => (data ? shownRows(data.rows, people) : null), [data, people]);
  const rows = useMemo(
    () => (all && isLong ? chosenRows(all, query, reader) : first),
    [all, isLong, first, query, reader],
  );
  const keys = useMemo(() => rows.map(rowKey), [rows]);
  return { rows, keys, problem: error instanceof Error ? error.message : null };
}

export function rowKey({ kind, number }: Pick<ShownRow, "kind" | "number">): string {
  return `${kind}-${number}`;
}

async function readSheet(address: string): Promise<SheetData> {
  const answer = await fetch(address);
  if (!answer.ok || !answer.body) throw new Error("The other rows could not be read. Load the page again.");
  const text = answer.body.pipeThrough(new DecompressionStream("gzip"));
  return (await new Response(text).json()) as SheetData;
}

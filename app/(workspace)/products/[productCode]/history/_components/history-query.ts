import { z } from "zod";

import type { HistoryFilter } from "@/lib/audit/queries";
import { OUTCOMES } from "@/lib/vocabulary/acts";

/** What the address of the history may say; anything else in it is read as if it were not there. */
export const HistoryQuery = z.object({
  person: z.coerce.number().int().positive().optional().catch(undefined),
  act: z
    .string()
    .regex(/^[a-z_]{1,40}$/)
    .optional()
    .catch(undefined),
  outcome: z.enum(OUTCOMES).optional().catch(undefined),
  from: z.iso.date().optional().catch(undefined),
  until: z.iso.date().optional().catch(undefined),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});
export type HistoryQuery = z.output<typeof HistoryQuery>;

const DAY = 86_400_000;

/** Whole days of UTC, the last one included. */
export function filterOf({ person, act, outcome, from, until }: HistoryQuery): Omit<HistoryFilter, "chain"> {
  return {
    ...(person === undefined ? {} : { personId: person }),
    ...(act === undefined ? {} : { act }),
    ...(outcome === undefined ? {} : { outcome }),
    ...(from === undefined ? {} : { from: `${from}T00:00:00.000Z` }),
    ...(until === undefined ? {} : { until: new Date(Date.parse(until) + DAY).toISOString() }),
  };
}

export function historyAddress(path: string, query: HistoryQuery, page: number): string {
  const parts = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    if (key !== "page" && value !== undefined) parts.set(key, String(value));
  }
  if (page > 1) parts.set("page", String(page));
  const text = parts.toString();
  return text === "" ? path : `${path}?${text}`;
}

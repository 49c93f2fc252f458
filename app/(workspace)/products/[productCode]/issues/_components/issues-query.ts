import { z } from "zod";

const IssueNumber = z.coerce.number().int().positive().optional().catch(undefined);

const Address = z.object({
  measure: z.string().trim().max(120).optional().catch(undefined),
  point: z
    .string()
    .regex(/^[A-Z0-9][A-Z0-9-]{0,11}$/)
    .optional()
    .catch(undefined),
  from: IssueNumber,
  to: IssueNumber,
  compare: z
    .string()
    .regex(/^\d{1,9},\d{1,9}$/)
    .optional()
    .catch(undefined),
});

export interface IssuesQuery {
  measure: string | undefined;
  point: string | undefined;
  /** Two issues to compare, in either direction; null where none or only one is asked for. */
  compare: { from: number; to: number } | null;
}

/** What the address of the issues sheet may say: "?from=3&to=5", or shorter "?compare=3,5". */
export function issuesQuery(searchParams: unknown): IssuesQuery {
  const { point, measure, from, to, compare } = Address.parse(searchParams);
  const [one = from, other = to] = compare?.split(",").map(Number) ?? [];
  if (one === undefined || other === undefined || one === other) return { point, measure, compare: null };
  return { point, measure, compare: { from: one, to: other } };
}

/** The same address with some of it changed. */
export function issuesAddress(productCode: string, query: IssuesQuery, change: Partial<IssuesQuery>): string {
  const { point, measure, compare } = { ...query, ...change };
  const parts = new URLSearchParams();
  if (point !== undefined) parts.set("point", point);
  if (measure !== undefined) parts.set("measure", measure);
  if (compare !== null) parts.set("compare", `${compare.from},${compare.to}`);
  const text = parts.toString();
  return `/products/${productCode}/issues${text === "" ? "" : `?${text}`}`;
}

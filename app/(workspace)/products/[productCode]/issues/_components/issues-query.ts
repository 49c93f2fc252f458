import { z } from "zod";

const IssueNumber = z.coerce.number().int().positive().optional().catch(undefined);

const Address = z.object({
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
  point: string | undefined;
  /** Two issues to compare, the earlier first; null where none or only one is asked for. */
  compare: { from: number; to: number } | null;
}

/** What the address of the issues sheet may say: "?from=3&to=5", or shorter "?compare=3,5". */
export function issuesQuery(searchParams: unknown): IssuesQuery {
  const { point, from, to, compare } = Address.parse(searchParams);
  const [one = from, other = to] = compare?.split(",").map(Number) ?? [];
  if (one === undefined || other === undefined || one === other) return { point, compare: null };
  return { point, compare: { from: Math.min(one, other), to: Math.max(one, other) } };
}

import { z } from "zod";
import {
  FEWEST_DRAWS,
  MOST_DRAWS,
  type MonteCarloOutcome,
  type MonteCarloResult,
} from "@/lib/evaluation/uncertainty/monte-carlo";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { LINE_KINDS, PRODUCT_KINDS } from "@/lib/vocabulary/lines";

/** What a run is given: a budget as it stands at an issue, one of its operating points, and how it is drawn. */
export interface MonteCarloJob {
  state: BudgetState;
  operatingPoint: string;
  draws: number;
  seed: number;
}

const Line = z
  .object({
    kind: z.enum(LINE_KINDS),
    number: z.string(),
    letter: z.string(),
    issue: z.int(),
    retired: z.boolean(),
    body: z.unknown(),
  })
  .transform(({ kind, body, ...revision }, context): LineState => {
    const parsed = parseBody(kind, body);
    if (parsed.ok) return { ...revision, ...parsed.content };
    context.addIssue({ code: "custom", message: `${kind} ${revision.number} is no line of its kind` });
    return z.NEVER;
  });

/** The job as it comes out of the message to the other thread. */
export const MonteCarloJob: z.ZodType<MonteCarloJob> = z.object({
  state: z.object({
    product: z.object({ code: z.string(), name: z.string(), kind: z.enum(PRODUCT_KINDS) }),
    lines: z.array(Line),
  }),
  operatingPoint: z.string(),
  draws: z.int().min(FEWEST_DRAWS).max(MOST_DRAWS),
  seed: z.int().min(0),
});

const head = { operatingPoint: z.string() };

export const MonteCarloNumbers: z.ZodType<MonteCarloResult> = z.object({
  ...head,
  draws: z.int(),
  seed: z.int(),
  refusedDraws: z.int(),
  basic: z.object({ mean: z.number(), standardDeviation: z.number(), low95: z.number(), high95: z.number() }),
  predicted: z.object({ mean: z.number(), standardDeviation: z.number() }),
  basicExceedsLimit: z.number(),
  predictedExceedsLimit: z.number(),
});

const Outcome: z.ZodType<MonteCarloOutcome> = z.union([
  z.object({ ...head, refused: z.array(z.string()) }),
  MonteCarloNumbers,
]);

/** What the other thread tells while it draws and at its end. */
export const MonteCarloMessage = z.discriminatedUnion("type", [
  z.object({ type: z.literal("progress"), done: z.int() }),
  z.object({ type: z.literal("result"), outcome: Outcome }),
]);
export type MonteCarloMessage = z.infer<typeof MonteCarloMessage>;

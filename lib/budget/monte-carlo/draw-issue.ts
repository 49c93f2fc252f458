import { z } from "zod";
import { canonicalJson } from "@/lib/audit/canonical-json";
import { textHash } from "@/lib/audit/text-hash";
import { FEWEST_DRAWS, type MonteCarloOutcome } from "@/lib/evaluation/uncertainty/monte-carlo";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { loadBudget } from "../load-budget";
import { issueNumber, readableProduct } from "../queries";
import type { MonteCarloJob } from "./job";
import { runMonteCarlo, type RunOptions } from "./run-monte-carlo";

const MOST_DRAWS = 1_000_000;

export const DrawIssueInput = z.object({
  productCode: z.string(),
  issue: z.union([z.int().min(1), z.literal("newest")]),
  operatingPoint: z.string(),
  draws: z
    .int("Give a whole number of draws.")
    .min(FEWEST_DRAWS, `At least ${FEWEST_DRAWS} draws: fewer say nothing about the ends of the interval.`)
    .max(MOST_DRAWS, `At most ${MOST_DRAWS} draws.`),
  seed: z.int("Give a whole number as the seed.").min(0, "A seed is 0 or greater."),
});
export type DrawIssueInput = z.infer<typeof DrawIssueInput>;

export interface DrawnIssue {
  issue: number;
  /** SHA-256 over everything that was drawn from: who has the same hash gets the same outcome. */
  inputHash: string;
  outcome: MonteCarloOutcome;
}

/** Draws an issue of a budget at one of its operating points. The database is read before and not held while it runs. */
export async function drawIssue(actor: Actor, input: DrawIssueInput, options: RunOptions = {}): Promise<DrawnIssue> {
  const { productCode, operatingPoint, draws, seed } = input;
  const { issue, state } = await inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const newest = await issueNumber(product, "newest", tx);
    const asked = input.issue === "newest" ? newest : input.issue;
    if (asked > newest) throw new Refusal("not_found", `There is no issue ${asked} of this budget.`);
    return loadBudget(product.id, asked, tx);
  });
  const isInForce = state.lines.some(
    ({ kind, number, retired }) => kind === "operating_point" && number === operatingPoint && !retired,
  );
  if (!isInForce) throw new Refusal("not_found", `Issue ${issue} has no operating point ${operatingPoint} in force.`);
  const job: MonteCarloJob = { state, operatingPoint, draws, seed };
  return { issue, inputHash: monteCarloInputHash(job), outcome: await runMonteCarlo(job, options) };
}

export function monteCarloInputHash(job: MonteCarloJob): string {
  return textHash("monte-carlo", canonicalJson(job));
}

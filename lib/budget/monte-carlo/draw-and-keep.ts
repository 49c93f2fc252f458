import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import type { MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Issue } from "@/models/issue";
import { Line } from "@/models/line";
import { MonteCarloRun } from "@/models/monte-carlo-run";
import { authorize } from "@/policies/authorize";
import { productByCode } from "../load-budget";
import { issueNumber } from "../queries";
import type { DrawIssueInput } from "./draw-issue";
import { keptResultHash, keptResultText, MONTE_CARLO_RECIPE } from "./kept-result";
import { drawInPlace } from "./draw-in-place";
import type { RunOptions } from "./run-monte-carlo";

const ACT = "run_monte_carlo";

export interface KeptRun {
  runId: number;
  issue: number;
}

/**
 * Draws an issue and keeps what came out. Nothing is held while it is drawn: what was asked is looked at before, so that
 * nobody waits in vain, and again in the transaction that writes.
 */
export async function drawAndKeep(
  actor: Actor,
  input: DrawIssueInput,
  clock: Clock,
  options: RunOptions = {},
): Promise<KeptRun> {
  const frame = { act: ACT, chain: input.productCode } as const;
  const { issue } = await performAct(actor, clock, frame, (tx) => placeOf(actor, input, tx));
  const asked = { ...input, issue };
  const { inputHash, outcome } = await drawInPlace(actor, asked, options);
  const result = resultOf(outcome);

  return performAct(actor, clock, frame, async (tx, record, at) => {
    const place = await placeOf(actor, asked, tx);
    const { draws, seed, operatingPoint, productCode } = input;
    const text = keptResultText(result);
    const hashes = { recipe: MONTE_CARLO_RECIPE, inputHash, resultHash: keptResultHash(text) };
    const by = { askedById: actor.userId, printedName: actor.printedName, ranAt: at };
    const run = await MonteCarloRun.create(
      { ...place, draws, seed, ...hashes, result: text, ...by },
      { transaction: tx },
    );
    record({
      act: ACT,
      subject: { type: "issue", id: String(issue), label: `${productCode} issue ${issue}` },
      now: { operatingPoint, draws, seed, ...hashes },
    });
    return { runId: run.id, issue };
  });
}

interface RunPlace {
  productId: number;
  issue: number;
  operatingPointId: number;
}

/** Who may, on what, and only once: a run with one seed and as many draws gives the same bytes. */
async function placeOf(actor: Actor, input: DrawIssueInput, tx: Transaction): Promise<RunPlace> {
  const { productCode, operatingPoint, draws, seed } = input;
  const product = await productByCode(productCode, tx);
  authorize(actor, { on: "Product", action: ACT, productId: product.id });
  const issue = input.issue === "newest" ? await issueNumber(product, "newest", tx) : input.issue;
  const isThere = await Issue.count({ where: { productId: product.id, number: issue }, transaction: tx });
  if (isThere === 0) throw new Refusal("not_found", `There is no issue ${issue} of this budget.`);
  const key = { productId: product.id, kind: "operating_point", number: operatingPoint } as const;
  const line = await Line.findOne({ where: key, transaction: tx });
  if (!line) throw new Refusal("not_found", `Issue ${issue} has no operating point ${operatingPoint} in force.`);

  const place = { productId: product.id, issue, operatingPointId: line.id };
  const alike = { ...place, draws, seed, recipe: MONTE_CARLO_RECIPE };
  if ((await MonteCarloRun.count({ where: alike, transaction: tx })) > 0) {
    const sentence = "This seed was drawn as often already: the same would come out. Choose another seed.";
    throw new Refusal("duplicate", sentence, [{ path: "seed", sentence }]);
  }
  return place;
}

function resultOf(outcome: MonteCarloResult | { operatingPoint: string; refused: string[] }): MonteCarloResult {
  if ("refused" in outcome) {
    const items = outcome.refused.join(", ");
    throw new Refusal("evaluation_refused", `Without a result there is no sum to draw: item ${items} is refused.`);
  }
  if (outcome.basic.standardDeviation === 0) {
    throw new Refusal("evaluation_refused", "Nothing here has a standard uncertainty: every draw is the same.");
  }
  return outcome;
}

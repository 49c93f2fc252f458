import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { keptResultText, MONTE_CARLO_RECIPE } from "./kept-result";
import { drawInPlace } from "./draw-in-place";
import type { RunOptions } from "./run-monte-carlo";
import { keptRun } from "./runs-of";

export interface RepeatedRun {
  runId: number;
  /** Whether what was drawn from has the hash that is kept. */
  sameInput: boolean;
  /** Whether the same bytes came out. */
  sameResult: boolean;
}

/** Draws a kept run again and compares: changes nothing, so that an auditor may ask for it too. */
export async function repeatRun(
  actor: Actor,
  productCode: string,
  runId: number,
  options: RunOptions = {},
): Promise<RepeatedRun> {
  const { text, ...kept } = await keptRun(actor, productCode, runId);
  if (kept.recipe !== MONTE_CARLO_RECIPE) {
    const sentence = `This run was made by ${kept.recipe}; what is installed draws by ${MONTE_CARLO_RECIPE}.`;
    throw new Refusal("evaluation_refused", sentence);
  }
  const { issue, operatingPoint, draws, seed } = kept;
  const { inputHash, outcome } = await drawInPlace(actor, { productCode, issue, operatingPoint, draws, seed }, options);
  const sameResult = !("refused" in outcome) && keptResultText(outcome) === text;
  return { runId, sameInput: inputHash === kept.inputHash, sameResult };
}

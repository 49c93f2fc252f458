import { canonicalJson } from "@/lib/audit/canonical-json";
import { textHash } from "@/lib/audit/text-hash";
import type { MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import { MonteCarloNumbers } from "./job";

/**
 * Names the generator, the quantile, the order in which causes are drawn, and the rounding. A change of any of them takes
 * the next number: a kept run tells by which it was made, and only the same one gives the same bytes again.
 */
export const MONTE_CARLO_RECIPE = "leeboard-monte-carlo/1";

/** What is kept and hashed of a run: its numbers have 12 significant digits already. */
export function keptResultText(result: MonteCarloResult): string {
  return canonicalJson(result);
}

export function keptResultHash(text: string): string {
  return textHash("monte-carlo-result", text);
}

export function parseKeptResult(text: string): MonteCarloResult {
  return MonteCarloNumbers.parse(JSON.parse(text));
}

import { DEFAULT_REVIEW_RULES } from "@/lib/vocabulary/review-rules";
import type { RoutingRule } from "@/policies/program-manager-reasons";

const NAMES: readonly string[] = ["reviewer", ...Object.keys(DEFAULT_REVIEW_RULES.programManagerOn)];

/** Whether a word read from a text is the name of a rule that asks for a signature. */
export function isRoutingRule(name: string): name is RoutingRule {
  return name !== "windowDays" && NAMES.includes(name);
}

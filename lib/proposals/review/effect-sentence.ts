import type { PointEffect } from "@/lib/evaluation/budget/effects";
import { formatNewtons } from "@/lib/units/format-newtons";
import { toHundredths } from "@/lib/units/rounding";
import type { Standing } from "@/lib/vocabulary/standing";

const BETTER: Record<Standing, string> = {
  inside: "inside again",
  into_the_reserve: "no longer over, but into the reserve",
  over: "over the limit",
};
const WORSE: Record<Standing, string> = {
  inside: "inside",
  into_the_reserve: "now into the reserve",
  over: "now over the limit",
};
const SAME: Record<Standing, string> = {
  inside: "still inside",
  into_the_reserve: "still into the reserve",
  over: "still over the limit",
};
const ORDER: readonly Standing[] = ["inside", "into_the_reserve", "over"];

/** What a change does at one operating point, in a sentence: "Predicted falls by 3.90 N; inside again." */
export function effectSentence({ operatingPoint, was, now, predictedDelta }: PointEffect): string {
  if (now === null) return `Operating point ${operatingPoint} is retired.`;
  if (was === null) return `A new operating point, ${operatingPoint}: ${SAME[now.standing].replace("still ", "")}.`;
  return `${moveWords(predictedDelta)}; ${standingWords(was.standing, now.standing)}.`;
}

function moveWords(delta: number): string {
  const hundredths = toHundredths(delta);
  if (hundredths === 0) return "Predicted does not move";
  return `Predicted ${hundredths < 0 ? "falls" : "rises"} by ${formatNewtons(Math.abs(delta))}`;
}

function standingWords(was: Standing, now: Standing): string {
  if (was === now) return SAME[now];
  return ORDER.indexOf(now) < ORDER.indexOf(was) ? BETTER[now] : WORSE[now];
}

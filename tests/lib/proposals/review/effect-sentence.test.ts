import { describe, expect, it } from "vitest";
import type { PointEffect, PointFigures } from "@/lib/evaluation/budget/effects";
import { effectSentence } from "@/lib/proposals/review/effect-sentence";
import type { Standing } from "@/lib/vocabulary/standing";

function figures(predicted: number, standing: Standing): PointFigures {
  const common = { limitHundredths: 10000, reserveHundredths: 1000, basic: 0, growth: 0 };
  return { ...common, predicted, margin: 100 - predicted, clearOfReserve: 90 - predicted, standing };
}

function effect(was: [number, Standing] | null, now: [number, Standing] | null): PointEffect {
  const delta = was && now ? now[0] - was[0] : 0;
  return {
    ...{ operatingPoint: "OP-1", name: "Cruise", predictedDelta: delta, marginDelta: -delta },
    was: was && figures(...was),
    now: now && figures(...now),
  };
}

describe("the sentence of an effect", () => {
  it.each([
    [effect([95, "into_the_reserve"], [89, "inside"]), "Predicted falls by 6.00\u2009N; inside again."],
    [effect([89, "inside"], [95, "into_the_reserve"]), "Predicted rises by 6.00\u2009N; now into the reserve."],
    [effect([99, "into_the_reserve"], [101, "over"]), "Predicted rises by 2.00\u2009N; now over the limit."],
    [
      effect([101, "over"], [95, "into_the_reserve"]),
      "Predicted falls by 6.00\u2009N; no longer over, but into the reserve.",
    ],
    [effect([101, "over"], [103, "over"]), "Predicted rises by 2.00\u2009N; still over the limit."],
    [effect([80, "inside"], [80.004, "inside"]), "Predicted does not move; still inside."],
    [effect(null, [101, "over"]), "A new operating point, OP-1: over the limit."],
    [effect([80, "inside"], null), "Operating point OP-1 is retired."],
  ])("says what moves and where it then stands", (point, sentence) => {
    expect(effectSentence(point)).toBe(sentence);
  });
});

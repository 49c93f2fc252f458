import { z } from "zod";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { budgetUncertainty, type PointUncertaintyOutcome } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { CAUSE_ORIGINS } from "@/lib/evaluation/uncertainty/cause";

/** What an issue keeps of how uncertain its totals are, to first order, at every operating point. */
export interface StoredUncertainty {
  points: PointUncertaintyOutcome[];
}

export function uncertaintyToStore(state: BudgetState, results: BudgetResults): StoredUncertainty {
  return { points: results.points.map(({ operatingPoint }) => budgetUncertainty(state, results, operatingPoint)) };
}

export function parseUncertainty(text: string): StoredUncertainty {
  return StoredUncertaintyText.parse(JSON.parse(text));
}

const number = z.number();
const head = { operatingPoint: z.string() };

const StoredPoint = z.object({
  ...head,
  basic: z.object({ value: number, standardUncertainty: number, low95: number, high95: number }),
  predicted: z.object({ value: number, standardUncertainty: number }),
  basicExceedsLimit: number,
  predictedExceedsLimit: number,
  items: z.array(z.object({ item: z.string(), standardUncertainty: number })),
  causes: z.array(
    z.object({
      key: z.string(),
      origin: z.enum(CAUSE_ORIGINS),
      name: z.string(),
      field: z.string().nullable(),
      newtons: number,
      share: number,
    }),
  ),
  otherCauses: z.object({ count: z.int(), share: number }),
});

const StoredUncertaintyText = z.object({
  points: z.array(z.union([z.object({ ...head, refused: z.array(z.string()) }), StoredPoint])),
});

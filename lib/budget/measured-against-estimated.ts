import { QueryTypes, type Transaction } from "sequelize";
import {
  type EstimateAndTest,
  isMeasured,
  type SuggestedGrowth,
  suggestGrowth,
} from "@/lib/evaluation/budget/estimate-to-test";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import { OPERATING_POINT_STATE_FIELDS } from "@/lib/evaluation/lines/operating-point-body";
import { sameBody } from "@/lib/evaluation/lines/same-body";
import type { Actor } from "@/lib/vocabulary/actor";
import type { MaturityGrade } from "@/lib/vocabulary/grades";
import { database, inSnapshot } from "@/models/database";
import { type LoadedBudget, loadBudget, newestIssue, toLineState } from "./load-budget";
import { readableProduct } from "./queries";

export interface MeasuredAgainstEstimated {
  pairs: EstimateAndTest[];
  /** Pairs that can't be compared: between the two the reference operating point, or its state, changed. */
  leftOut: number;
  suggestions: SuggestedGrowth[];
}

/** What tests made of the estimates before them, from the issues of a product as they were frozen. */
export function measuredAgainstEstimated(actor: Actor, productCode: string): Promise<MeasuredAgainstEstimated> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const newest = await newestIssue(product.id, tx);
    if (newest === null) return { pairs: [], leftOut: 0, suggestions: [] };

    const budgetAt = issueReader(product.id, tx);
    const pairs: EstimateAndTest[] = [];
    let leftOut = 0;
    for (const { item, estimated, measured } of steps(await itemRevisions(product.id, tx))) {
      const [before, after] = [await budgetAt(estimated.lastIssue), await budgetAt(measured.issue)];
      const estimate = valueOf(item, before);
      const value = valueOf(item, after);
      if (estimate === null || value === null || estimate === 0 || !sameReference(before, after)) leftOut += 1;
      else pairs.push({ item, ...factsOf(estimated, measured), estimate, measured: value });
    }
    const { terms } = indexState((await budgetAt(newest)).state);
    return { pairs, leftOut, suggestions: suggestGrowth(pairs, terms.growthTable) };
  });
}

interface Stretch {
  issue: number;
  /** The last issue at which it held. */
  lastIssue: number;
  retired: boolean;
  body: ItemBody;
}

function factsOf(estimated: Stretch, measured: Stretch) {
  const { name, grade, method } = estimated.body;
  return { name, grade, method, estimateIssue: estimated.lastIssue, measuredIssue: measured.issue };
}

/** For every item that became measured: the last estimate of each grade before, with the measured revision. */
function* steps(revisions: ReadonlyMap<string, readonly Stretch[]>) {
  for (const [item, stretches] of revisions) {
    const at = stretches.findIndex(({ body, retired }) => !retired && isMeasured(body.grade));
    const measured = stretches[at];
    if (!measured) continue;
    const byGrade = new Map<MaturityGrade, Stretch>();
    for (const stretch of stretches.slice(0, at)) if (!stretch.retired) byGrade.set(stretch.body.grade, stretch);
    for (const estimated of byGrade.values()) yield { item, estimated, measured };
  }
}

async function itemRevisions(productId: number, tx: Transaction): Promise<Map<string, Stretch[]>> {
  const rows = await database.query<Parameters<typeof toLineState>[0]>(
    `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body
     FROM line_revisions r JOIN lines l ON l.id = r.line_id
     WHERE l.product_id = :productId AND l.kind = 'item' ORDER BY l.number, r.issue`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
  const byItem = new Map<string, Stretch[]>();
  for (const line of rows.map(toLineState)) {
    if (line.kind !== "item") continue;
    const stretches = byItem.get(line.number) ?? [];
    const last = stretches.at(-1);
    if (last) last.lastIssue = line.issue - 1;
    stretches.push({ issue: line.issue, lastIssue: line.issue, retired: line.retired, body: line.body });
    byItem.set(line.number, stretches);
  }
  return byItem;
}

/** Each issue is loaded once, however many items were measured in it. */
function issueReader(productId: number, tx: Transaction): (issue: number) => Promise<LoadedBudget> {
  const loaded = new Map<number, LoadedBudget>();
  return async (issue) => {
    const budget = loaded.get(issue) ?? (await loadBudget(productId, issue, tx));
    loaded.set(issue, budget);
    return budget;
  };
}

/** Basic estimate at the reference operating point, N; null where it is refused. */
function valueOf(item: string, { results }: LoadedBudget): number | null {
  const result = results.points[0]?.items.find((each) => each.item === item);
  return result && !result.refused ? result.basic : null;
}

function sameReference(before: LoadedBudget, after: LoadedBudget): boolean {
  const [was, now] = [before, after].map(({ state }) => {
    const { terms, operatingPoints } = indexState(state);
    return operatingPoints.get(terms.referenceOperatingPoint);
  });
  return OPERATING_POINT_STATE_FIELDS.every((field) => sameBody(was?.[field], now?.[field]));
}

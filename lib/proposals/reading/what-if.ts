import type { Transaction } from "sequelize";
import { newestIssue } from "@/lib/budget/load-budget";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import { effectsOf } from "@/lib/evaluation/budget/effects-of";
import { type EffectBasis, effectBases } from "@/lib/evaluation/measures/effect-bases";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { isAllowed } from "@/policies/authorize";
import { budgetReader, type BudgetReader } from "../records/budget-reader";
import { effectView } from "../review/effect-views";
import { jointChange, type JointProposal, type JointStep } from "../review/joint-change";
import { previewProposal, type BudgetAtIssue } from "../review/preview-proposal";
import { peopleOf, reading } from "../records/product-reading";
import { keyOf, labelOf, proposalQuestion, proposalsOf, type ProposalRecord } from "../records/proposal-record";
import { roundOf, type RoundRecord } from "../records/round-record";
import { unsubmittedRound } from "../records/unsubmitted-round";
import type { EffectView, PersonView, ProductView } from "../views";

/** One proposal that may be ticked. */
export interface WhatIfCandidate {
  key: string;
  label: string;
  title: string;
  state: "draft" | "proposed";
  proposer: PersonView;
  isTicked: boolean;
  /** What it does alone to the predicted total at the worst operating point of today's issue, in newtons. */
  predictedDelta: number | null;
}

/** One row of the allocations sheet that the set would move, in hundredths of a newton; null where there is no row. */
export interface MovedAllocation {
  name: string;
  was: number | null;
  toBe: number | null;
}

export interface WhatIfView {
  product: ProductView;
  issue: number;
  worstPoint: string;
  candidates: WhatIfCandidate[];
  /** Of the ticked ones, in the order of their numbers. */
  steps: JointStep[];
  /** To what forces are referred today and with the set. */
  bases: EffectBasis[];
  /** null while nothing that is ticked counts. */
  effect: EffectView | null;
  allocations: MovedAllocation[];
}

/**
 * What a set of proposals would do together, if they were approved in the order of their numbers; drafts come last. It
 * reads and computes, and writes nothing. null where there is no such product or it is not established.
 */
export function whatIfView(
  actor: Actor,
  productCode: string,
  ticked: readonly string[],
  clock: Clock = systemClock,
): Promise<WhatIfView | null> {
  return reading(actor, productCode, async ({ product, tx }) => {
    if ((await newestIssue(product.id, tx)) === null) return null;
    const budgets = budgetReader(product.id, tx);
    const today = await budgets.newest();
    const found = await tickable(actor, product.id, { budgets, at: clock().toISOString(), tx });
    const people = await peopleOf(product.id, tx);
    const set = found.filter(({ proposal }) => ticked.includes(keyOf(proposal)));
    const { steps, after } = jointChange(
      today,
      set.map(({ joint }) => joint),
      people,
    );
    const { id, code, name, kind } = product;
    return {
      product: { id, code, name, kind },
      issue: today.issue,
      worstPoint: today.results.worstPoint,
      candidates: found.map((each) => candidate(each, today, people, set.includes(each))),
      steps,
      bases: effectBases(today, after),
      effect: after === today ? null : jointEffect(today, after, set),
      allocations: movedAllocations(today, after),
    };
  });
}

interface Tickable {
  proposal: ProposalRecord;
  state: WhatIfCandidate["state"];
  title: string;
  joint: JointProposal;
}

interface Sources {
  budgets: BudgetReader;
  at: string;
  tx: Transaction;
}

/** What is proposed, by number, then the drafts that the reader may see. */
async function tickable(actor: Actor, productId: number, sources: Sources): Promise<Tickable[]> {
  const visible = (await proposalsOf(productId, sources.tx)).filter((proposal) =>
    isAllowed(actor, proposalQuestion(proposal, actor, "read")),
  );
  const found: Tickable[] = [];
  for (const proposal of visible.sort(byNumber)) {
    const { state } = proposal;
    if (state !== "draft" && state !== "proposed") continue;
    const round = await roundToThinkOf(proposal, sources);
    if (!round) continue;
    const base = await sources.budgets.at(round.baseIssue);
    const { rules, edits, transfers, title } = round;
    const joint = { key: keyOf(proposal), label: labelOf(proposal), base, rules, edits, transfers };
    found.push({ proposal, state, title, joint });
  }
  return found;
}

function byNumber(one: ProposalRecord, other: ProposalRecord): number {
  return (one.number ?? Infinity) - (other.number ?? Infinity) || one.id - other.id;
}

function roundToThinkOf(proposal: ProposalRecord, { budgets, at, tx }: Sources): Promise<RoundRecord | null> {
  return proposal.state === "draft"
    ? unsubmittedRound(proposal, budgets, at, tx)
    : roundOf(proposal.id, proposal.round, tx);
}

function candidate(
  { proposal, state, title, joint }: Tickable,
  today: BudgetAtIssue,
  people: ReadonlyMap<number, string>,
  isTicked: boolean,
): WhatIfCandidate {
  const context = { rules: joint.rules, earlierMoves: [], isSubmittedByManager: false };
  const { effects } = previewProposal(today, joint, context).change;
  const worst = effects.points.find(({ operatingPoint }) => operatingPoint === today.results.worstPoint);
  return {
    key: joint.key,
    label: joint.label,
    title,
    state,
    proposer: { id: proposal.proposerId, name: people.get(proposal.proposerId) ?? "" },
    isTicked,
    predictedDelta: worst?.predictedDelta ?? null,
  };
}

function jointEffect(today: BudgetAtIssue, after: BudgetAtIssue, set: readonly Tickable[]): EffectView {
  const edits = set.flatMap(({ joint }) => joint.edits);
  const edited = edits.filter(({ kind }) => kind === "item").map(({ number }) => number);
  return effectView({ before: today, after, edits, effects: effectsOf(today.results, after.results, edited) });
}

function movedAllocations(today: BudgetAtIssue, after: BudgetAtIssue): MovedAllocation[] {
  if (after === today) return [];
  const [was, toBe] = [sheetRows(today), sheetRows(after)];
  return [...new Map([...toBe, ...was]).keys()].flatMap((key) => {
    const [before, now] = [was.get(key), toBe.get(key)];
    const row = { name: now?.name ?? before?.name ?? key, was: before?.held ?? null, toBe: now?.held ?? null };
    return row.was === row.toBe ? [] : [row];
  });
}

function sheetRows({ state, results }: BudgetAtIssue): Map<string, { name: string; held: number | null }> {
  const view = allocationsView(state, results);
  const whole = [
    ["Unallocated", view.unallocatedHundredths],
    ["Reserve", view.reserveHundredths],
    ["Limit", view.limitHundredths],
  ] as const;
  return new Map([
    ...view.lines.map(({ kind, number, name, allocationHundredths }) => {
      const row = kind === "group" ? `Group ${number} ${name}` : `${number} ${name}`;
      return [`${kind} ${number}`, { name: row, held: allocationHundredths }] as const;
    }),
    ...whole.map(([name, held]) => [name, { name, held }] as const),
  ]);
}

import { z } from "zod";
import type { LoadedBudget } from "@/lib/budget/load-budget";
import type { ActRecord } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Proposal } from "@/models/proposal";
import { authorize } from "@/policies/authorize";
import { actOnProposal, type ProposalAct } from "../records/act-on-proposal";
import { answeredBefore, keepAnswer } from "../records/answered-before";
import { budgetReader } from "../records/budget-reader";
import { checkedSubmission } from "./check-submission";
import { isOpen, wrongStateSentence } from "../records/moves";
import { noteEditor } from "../records/note-editor";
import { proposalById, proposalQuestion } from "../records/proposal-record";
import { DraftEdit, type CarryForwardInput, type SettlementChoice } from "../schema";
import { carriedEdits, settledEdit, type CarriedEdit } from "../review/settlement";
import { replaceWorkingCopy, storedChange } from "../records/working-copy";
import { writeRound } from "./write-round";

const Carried = z.object({ lockVersion: z.int(), round: z.int().nullable() });
export type Carried = z.infer<typeof Carried>;

/**
 * Brings the working copy onto the newest issue. Fields that one side changed carry by themselves; where both changed
 * one, the settlement says which value stands and why. What is proposed gets its next round by it.
 */
export function carryForward(actor: Actor, input: CarryForwardInput, clock: Clock = systemClock): Promise<Carried> {
  const { proposalId } = input;
  return actOnProposal(actor, clock, { act: "carry_forward", proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    authorize(actor, proposalQuestion(proposal, actor, "edit"));
    const form = { userId: actor.userId, act: "carry_forward" as const, key: input.key };
    const earlier = await answeredBefore(form, Carried, tx);
    if (earlier) return earlier;
    if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));

    const [base, onto] = await bothIssues(context);
    if (proposal.lockVersion !== input.lockVersion || onto.issue !== input.ontoIssue) throw movedSince();
    if (base.issue === onto.issue) throw new Refusal("wrong_state", "It stands on the newest issue already.");
    await moveWorkingCopy(context, base, onto, input.settled);
    await noteEditor(proposal.id, actor.userId, at, tx);

    const settlement = settlementRecord(input.settled);
    const round = proposal.state === "proposed" ? await nextRound(actor, context, settlement) : null;
    if (round === null) record({ was: { baseIssue: base.issue }, now: { baseIssue: onto.issue }, ...settlement });
    const answer = { lockVersion: (await proposalById(proposal.id, tx)).lockVersion, round };
    await keepAnswer(form, answer, at, tx);
    return answer;
  });
}

async function bothIssues({ proposal, tx }: ProposalAct): Promise<[LoadedBudget, LoadedBudget]> {
  const budgets = budgetReader(proposal.productId, tx);
  return [await budgets.at(proposal.baseIssue), await budgets.newest()];
}

async function moveWorkingCopy(
  { tx, proposal }: ProposalAct,
  base: LoadedBudget,
  onto: LoadedBudget,
  settled: readonly SettlementChoice[],
): Promise<void> {
  const stored = await storedChange({ proposalId: proposal.id }, tx);
  const carried = carriedEdits(base.state, onto.state, stored.edits);
  const obstacles = carried.flatMap(({ obstacle }) => obstacle ?? []);
  if (obstacles.length > 0) throw new Refusal("overtaken", obstacles.join(" "));
  const edits = carried.map((each) => {
    const choices = choicesFor(each, settled);
    refuseUnsettled(each, choices);
    return DraftEdit.parse(settledEdit(each, choices));
  });
  await replaceWorkingCopy(proposal, { ...stored, edits }, tx);
  await Proposal.update(
    { baseIssue: onto.issue, lockVersion: proposal.lockVersion + 1 },
    { where: { id: proposal.id }, transaction: tx },
  );
}

function choicesFor({ edit }: CarriedEdit, settled: readonly SettlementChoice[]) {
  const mine = settled.filter(({ kind, number }) => kind === edit.kind && number === edit.number);
  return new Map(mine.map(({ field, choice }) => [field, choice]));
}

function refuseUnsettled({ edit, merges }: CarriedEdit, choices: ReadonlyMap<string, unknown>): void {
  const faults = merges
    .filter(({ field, side }) => side === "conflict" && !choices.has(field))
    .map(({ field }) => ({
      path: `settled.${edit.kind}.${edit.number}.${field}`,
      sentence: `Both sides changed ${field} of ${edit.number}: say which value stands and why.`,
    }));
  const [first] = faults;
  if (first) throw new Refusal("invalid", first.sentence, faults);
}

/** What was proposed stays proposed: the carried copy is its next round, checked like any submission. */
async function nextRound(actor: Actor, context: ProposalAct, details: Partial<ActRecord>): Promise<number> {
  const proposal = await proposalById(context.proposal.id, context.tx);
  const carried = { ...context, proposal };
  const submission = await checkedSubmission(actor, carried);
  const how = { signsBySubmitting: false, act: "carry_forward", details } as const;
  const { round } = await writeRound(actor, carried, { ...submission, ...how });
  return round;
}

/** Every choice with its reason goes into the history. */
function settlementRecord(settled: readonly SettlementChoice[]): Pick<ActRecord, "reason"> {
  if (settled.length === 0) return {};
  return {
    reason: settled.map(({ number, field, choice, why }) => `${number} ${field}: ${choice}. ${why}`).join("\n"),
  };
}

function movedSince(): Refusal {
  return new Refusal("moved", "A newer issue or another save came in between: look at the settlement table again.");
}

import { textHash } from "@/lib/audit/text-hash";
import { canonicalJson } from "@/lib/audit/canonical-json";
import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import type { ActRecord } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import { Product } from "@/models/product";
import { Proposal } from "@/models/proposal";
import { Round } from "@/models/round";
import { RoundEdit } from "@/models/round-edit";
import { RoundTransfer } from "@/models/round-transfer";
import type { ProposalAct } from "../records/act-on-proposal";
import type { Submission } from "./check-submission";
import { stateAfter } from "../records/moves";
import { noteEditor } from "../records/note-editor";
import { budgetReader } from "../records/budget-reader";
import { mailProposed, mailSuperseded } from "../notices/mails";
import { keyOf, labelOf, proposalById, subjectOf } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { reviewRound } from "../review/round-review";
import { whatMoved } from "../review/what-moved";
import { roundText } from "../review/round-text";
import { editRowsOf, replaceWorkingCopy, transferRowsOf } from "../records/working-copy";

type SubmittedRound = Submission & {
  signsBySubmitting: boolean;
  act: "propose" | "propose_next_round" | "carry_forward";
  details?: Partial<ActRecord>;
};

/** Writes the next round with what was submitted, moves the proposal and tells the signers. */
export async function writeRound(actor: Actor, context: ProposalAct, submission: SubmittedRound) {
  const { tx, at, proposal, record } = context;
  const { base, change, signsBySubmitting, act } = submission;
  const number = proposal.number ?? (await nextProposalNumber(proposal.productId, context));
  const numbered = { ...proposal, number };
  const round = proposal.round + 1;
  const { title, reason, neededBy } = proposal;
  const rules = termsOf(base.state).reviewRules;
  const text = roundText({ label: labelOf(numbered), number: round, title, reason, neededBy, base, rules, ...change });
  const hash = textHash("round", text);
  const kept = { title, reason, neededBy, evidence: "[]", rules: canonicalJson(rules), canonicalText: text, hash };
  const submitted = { submittedById: actor.userId, submittedAt: at, baseIssue: base.issue };
  const row = await Round.create(
    {
      ...{ proposalId: proposal.id, number: round, ...kept, ...submitted },
      submittedAs: signsBySubmitting ? "program_manager" : null,
    },
    { transaction: tx },
  );
  const edits = await editRowsOf(proposal.productId, change.edits, tx);
  await RoundEdit.bulkCreate(
    edits.map((edit) => ({ roundId: row.id, ...edit })),
    { transaction: tx },
  );
  await RoundTransfer.bulkCreate(
    transferRowsOf(change.transfers).map((transfer) => ({ roundId: row.id, ...transfer })),
    { transaction: tx },
  );

  await replaceWorkingCopy(proposal, change, tx);
  await noteEditor(proposal.id, actor.userId, at, tx);
  const state = stateAfter(proposal.state, proposal.state === "proposed" ? "revise" : "propose");
  await Proposal.update(
    { number, state, round, baseIssue: base.issue, lockVersion: proposal.lockVersion + 1 },
    { where: { id: proposal.id }, transaction: tx },
  );
  record({
    act,
    subject: subjectOf(numbered),
    was: { state: proposal.state, round: proposal.round },
    now: { state, round, baseIssue: base.issue, hash, title },
    reason,
    ...submission.details,
    ...(signsBySubmitting ? { capacity: "program_manager" } : {}),
  });
  await mailRound(actor, context, round);
  return { key: keyOf(numbered), number, round };
}

/** Earlier signers are told what moved, everybody else who may sign that they are asked. */
async function mailRound(actor: Actor, { tx, at, proposal: { id } }: ProposalAct, number: number): Promise<void> {
  const proposal = await proposalById(id, tx);
  const [earlier, round] = [await roundOf(id, number - 1, tx), await roundOf(id, number, tx)];
  if (!round) throw new Error(`Round ${number} of proposal ${id} was not written.`);
  const context = { tx, at, proposal };
  if (earlier) await mailSuperseded(actor, context, { round: number, moved: whatMoved(earlier, round) });
  const { routing } = await reviewRound(proposal, round, budgetReader(proposal.productId, tx), { at, tx });
  await mailProposed(actor, context, { routing, round });
}

async function nextProposalNumber(productId: number, { tx }: ProposalAct): Promise<number> {
  const product = await Product.findByPk(productId, { transaction: tx, rejectOnEmpty: true });
  const number = product.nextProposalNumber;
  await product.update({ nextProposalNumber: number + 1 }, { transaction: tx });
  return number;
}

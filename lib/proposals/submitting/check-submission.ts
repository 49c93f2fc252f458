import type { Transaction } from "sequelize";
import { approvedMoves } from "@/lib/budget/approved-moves";
import type { LoadedBudget } from "@/lib/budget/load-budget";
import { membersAt } from "@/lib/budget/members";
import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import { namedFault } from "@/lib/evaluation/lines/named-fault";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal, type FieldFault } from "@/lib/vocabulary/refusal";
import type { Member } from "@/policies/signing-rights";
import type { ProposalAct } from "../records/act-on-proposal";
import { actorsOf, authorizeChange } from "../drafting/authorize-change";
import { budgetReader } from "../records/budget-reader";
import { stampedJustifications } from "../review/change-checks";
import { fileFaults } from "./file-faults";
import { overtakenReasons } from "../review/overtaken";
import { previewProposal, type ProposalPreview } from "../review/preview-proposal";
import type { ProposalRecord } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { sameValue } from "../records/same-value";
import { storedChange, type StoredChange } from "../records/working-copy";

export interface Submission {
  base: LoadedBudget;
  change: StoredChange;
  preview: ProposalPreview;
  members: Member[];
}

/** The working copy on the newest issue, with everything that speaks against submitting it refused. */
export async function checkedSubmission(actor: Actor, { tx, at, proposal }: ProposalAct): Promise<Submission> {
  const budgets = budgetReader(proposal.productId, tx);
  const [drafted, base] = [await budgets.at(proposal.baseIssue), await budgets.newest()];
  const stored = await storedChange({ proposalId: proposal.id }, tx);
  const members = await membersAt(proposal.productId, at, tx);
  const editors = members.filter(({ userId }) => [proposal.proposerId, ...proposal.coEditorIds].includes(userId));
  authorizeChange(actor, [actor, ...actorsOf(proposal.productId, editors)], { ...proposal, state: base.state }, stored);
  refuseOvertaken(overtakenReasons(drafted.state, base.state, stored.edits));
  refuseUnexplained(proposal);
  refuseFaults(await fileFaults(actor, { ...proposal, edits: stored.edits, base: base.state }, tx));

  const isManager = members.some(({ userId, roles }) => userId === actor.userId && roles.includes("program_manager"));
  const preview = await previewOf(stored, base, members, { at, isManager, tx });
  const change = { ...stored, edits: stored.edits.map((edit) => stamped(edit, base, preview)) };
  const stampedPreview = await previewOf(change, base, members, { at, isManager, tx });
  refuseObstacles(stampedPreview, change.edits);
  await refuseRepeated(proposal, base.issue, change, tx);
  return { base, change, preview: stampedPreview, members };
}

async function previewOf(
  change: StoredChange,
  base: LoadedBudget,
  members: readonly Member[],
  { at, isManager, tx }: { at: string; isManager: boolean; tx: Transaction },
): Promise<ProposalPreview> {
  const rules = termsOf(base.state).reviewRules;
  const earlierMoves = await approvedMoves(base.product.id, at, rules.programManagerOn.windowDays, tx);
  const routing = { rules, earlierMoves, isSubmittedByManager: isManager };
  const owners = new Set(
    members
      .filter(({ roles }) => roles.includes("component_owner") || roles.includes("program_manager"))
      .map(({ userId }) => userId),
  );
  return previewProposal(base, change, routing, { mayOwn: (userId) => owners.has(userId) });
}

type DraftEdit = StoredChange["edits"][number];

function stamped(edit: DraftEdit, base: LoadedBudget, { change }: ProposalPreview): DraftEdit {
  if (edit.body === null) return edit;
  const justifications = stampedJustifications(edit, base.state, change.after.results);
  return justifications === null ? edit : { ...edit, body: { ...edit.body, justifications } };
}

function refuseOvertaken(reasons: readonly string[]): void {
  if (reasons.length === 0) return;
  throw new Refusal("overtaken", `Carry it forward to the newest issue first. ${reasons.join(" ")}`);
}

function refuseUnexplained({ title, reason }: ProposalRecord): void {
  const faults = [
    ...(title.length >= 3 ? [] : [{ path: "title", sentence: "Give the proposal a title." }]),
    ...(reason.length >= 3 ? [] : [{ path: "reason", sentence: "Say why the change is needed." }]),
  ];
  refuseFaults(faults);
}

function refuseFaults(faults: readonly FieldFault[]): void {
  const [first] = faults;
  if (first) throw new Refusal("invalid", first.sentence, faults);
}

function refuseObstacles({ obstacles }: ProposalPreview, edits: StoredChange["edits"]): void {
  const [first] = obstacles;
  if (!first) return;
  const more = obstacles.length > 1 ? ` (and ${obstacles.length - 1} more)` : "";
  throw new Refusal(
    first.code,
    `${namedFault(edits, first)}${more}`,
    obstacles.map(({ path, sentence }) => ({ path, sentence })),
  );
}

/** Signers of an open round should not lose their signatures to a round that says the same. */
async function refuseRepeated(proposal: ProposalRecord, baseIssue: number, change: StoredChange, tx: Transaction) {
  if (proposal.state !== "proposed") return;
  const round = await roundOf(proposal.id, proposal.round, tx);
  if (!round || round.baseIssue !== baseIssue) return;
  const facts = ({ title, reason, neededBy }: typeof proposal | typeof round) => ({ title, reason, neededBy });
  if (!sameValue(facts(round), facts(proposal))) return;
  if (!sameValue(round.edits, change.edits) || !sameValue(round.transfers, change.transfers)) return;
  throw new Refusal("invalid", `Nothing has changed since round ${round.number}.`, []);
}

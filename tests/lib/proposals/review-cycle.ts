import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { propose } from "@/lib/proposals/submitting/propose";
import { proposalById } from "@/lib/proposals/records/proposal-record";
import { roundOf } from "@/lib/proposals/records/round-record";
import { reviewRound } from "@/lib/proposals/review/round-review";
import { budgetReader } from "@/lib/proposals/records/budget-reader";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { DraftContent, type SignProposalInput } from "@/lib/proposals/schema";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { hashPassword } from "@/lib/users/password";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import type { Capacity } from "@/lib/vocabulary/roles";
import { inSnapshot } from "@/models/database";
import { addItem, bluffItem, establish } from "@/tests/support/budget-on-file";
import { person, product, withRole } from "@/tests/support/people";
import { steppingClock } from "@/tests/support/recorded-product";

export const CODE = "TF-2";
export const PASSWORD = "north wind and spray";

/** Two owners, two reviewers, two program managers and an auditor of one established product. */
export interface Team {
  clock: Clock;
  tansy: Actor;
  odo: Actor;
  ines: Actor;
  elske: Actor;
  lusia: Actor;
  fenno: Actor;
  maud: Actor;
}

/** A cheap cost: what is tested here is the review, not the strength of the hash. */
const passwordHash = hashPassword(PASSWORD, { logN: 4, r: 8, p: 1 });

export async function team(limit = 10000, reserve = 1000): Promise<Team> {
  await product(CODE);
  const hash = await passwordHash;
  const member = async (name: string, role: Parameters<typeof withRole>[2]) =>
    withRole(await person(name, { passwordHash: hash }), CODE, role);
  const people = {
    tansy: await member("Tansy Owner", "component_owner"),
    odo: await member("Odo Owner", "component_owner"),
    ines: await member("Ines Reviewer", "reviewer"),
    elske: await member("Elske Reviewer", "reviewer"),
    lusia: await member("Lusia Manager", "program_manager"),
    fenno: await member("Fenno Manager", "program_manager"),
    maud: await member("Maud Auditor", "auditor"),
  };
  await establish(people.lusia, CODE, "2026-02-01T08:00:00.000Z", { limit, reserve });
  return { ...people, clock: steppingClock("2026-03-01T08:00:00.000Z") };
}

let forms = 0;
export const formKey = () => `form-${String(++forms).padStart(8, "0")}`;

export type Content = Partial<DraftContent>;

export function content(more: Content): DraftContent {
  return DraftContent.parse({
    title: "A change",
    reason: "Because it was measured.",
    neededBy: null,
    edits: [],
    transfers: [],
    ...more,
  });
}

export function editOf({ operation, kind, number, baseLetter, body }: LineEdit) {
  return DraftContent.shape.edits.element.parse({ operation, kind, number, baseLetter, body });
}

export function adding(number: string, ownerId: number, coefficient: number, more: object = {}) {
  return editOf(addItem(number, bluffItem(ownerId, coefficient, 0.1, more)));
}

export function revising(number: string, baseLetter: string, ownerId: number, coefficient: number, more: object = {}) {
  return { ...adding(number, ownerId, coefficient, more), operation: "revise" as const, baseLetter };
}

/** Starts, fills and submits a draft; answers the proposal's id. */
export async function proposed(actor: Actor, clock: Clock, more: Content, password: string | null = null) {
  const { proposalId } = await startDraft(actor, { productCode: CODE, title: "", key: formKey() }, clock);
  await saveDraft(actor, { proposalId, lockVersion: 0, content: content(more) }, clock);
  await propose(actor, { proposalId, lockVersion: 1, key: formKey(), password }, clock);
  return proposalId;
}

export function reviewOf(proposalId: number, clock: Clock) {
  return inSnapshot(async (tx) => {
    const proposal = await proposalById(proposalId, tx);
    const round = await roundOf(proposalId, proposal.round, tx);
    if (!round) throw new Error("not submitted");
    const at = clock().toISOString();
    return reviewRound(proposal, round, budgetReader(proposal.productId, tx), { at, tx });
  });
}

/** What a form sends that shows the sheet as it is now. */
export async function approval(
  proposalId: number,
  capacity: Capacity,
  clock: Clock,
): Promise<Extract<SignProposalInput, { decision: "approve" }>> {
  const { round, textHash } = await reviewOf(proposalId, clock);
  const shown = { proposalId, roundHash: round.hash, textHash };
  return { ...shown, decision: "approve", capacity, meaning: "Checked", deputyForId: null, password: PASSWORD };
}

export async function approves(actor: Actor, proposalId: number, capacity: Capacity, clock: Clock) {
  return signProposal(actor, await approval(proposalId, capacity, clock), clock);
}

/** An approved proposal that adds items, signed by Ines and Lusia: the next issue. */
export async function approvedItems(people: Team, edits: Content["edits"], proposer = people.tansy) {
  const { ines, lusia, clock } = people;
  const proposalId = await proposed(proposer, clock, { title: "New items", edits });
  await approves(ines, proposalId, "reviewer", clock);
  return approves(lusia, proposalId, "program_manager", clock);
}

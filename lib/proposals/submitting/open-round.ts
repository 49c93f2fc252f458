import type { Actor } from "@/lib/vocabulary/actor";
import type { Decision } from "@/lib/vocabulary/proposals";
import { Refusal } from "@/lib/vocabulary/refusal";
import { ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import { authorize } from "@/policies/authorize";
import { demandIndependence } from "@/policies/independence";
import { signingRights, type SigningRight } from "@/policies/signing-rights";
import type { ProposalAct } from "../records/act-on-proposal";
import { budgetReader } from "../records/budget-reader";
import { stateAfter, type Move } from "../records/moves";
import { roundOf } from "../records/round-record";
import { reviewRound, type RoundReview } from "../review/round-review";

export interface Signing {
  decision: Exclude<Decision, "take_back">;
  capacity: Capacity;
  deputyForId: number | null;
}

/**
 * The round that is open to signers, for somebody who may sign it: the role first, then the state of the proposal,
 * then independence. Every refusal says what its reader can do.
 */
export async function openRound(actor: Actor, context: ProposalAct, signing: Signing): Promise<RoundReview> {
  const { tx, at, proposal } = context;
  const { decision, capacity, deputyForId } = signing;
  const { productId } = proposal;
  const action = decision === "disapprove" ? "disapprove" : (`sign_as_${capacity}` as const);
  authorize(actor, { on: "Round", action, productId, asDeputy: deputyForId !== null });

  const move: Record<Signing["decision"], Move> = { approve: "approve", return: "return", disapprove: "disapprove" };
  const round = await roundOf(proposal.id, proposal.round, tx);
  if (!round) throw new Refusal("wrong_state", "This proposal has not been submitted yet.");
  stateAfter(proposal.state, move[decision]);
  const review = await reviewRound(proposal, round, budgetReader(productId, tx), { at, tx });
  demandRight(actor, review, signing);
  return review;
}

/** Barred persons are told why; a deputy must have been named for this day; a named reviewer signs alone. */
function demandRight(
  actor: Actor,
  { signing, people }: RoundReview,
  { decision, capacity, deputyForId }: Signing,
): void {
  const deputyFor =
    deputyForId === null ? null : { userId: deputyForId, printedName: people.get(deputyForId) ?? "That person" };
  demandIndependence(actor.userId, deputyFor, signing.barred);
  // A return stays open to every one, also where one reviewer is named to fill the capacity.
  const facts = decision === "return" ? { ...signing, namedReviewerId: null } : signing;
  const isMine = (right: SigningRight) =>
    right.userId === actor.userId && (right.deputyFor?.userId ?? null) === deputyForId;
  if (signingRights(capacity, facts).some(isMine)) return;
  if (deputyFor) throw new Refusal("forbidden", `You are not named as deputy of ${deputyFor.printedName} for today.`);
  const named = facts.namedReviewerId === null ? null : people.get(facts.namedReviewerId);
  if (capacity === "reviewer" && named) throw new Refusal("forbidden", `${named} is named as the reviewer here.`);
  throw new Refusal("forbidden", `You do not hold the role of ${ROLE_NAMES[capacity].toLowerCase()} here.`);
}

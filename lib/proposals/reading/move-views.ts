import type { Actor } from "@/lib/vocabulary/actor";
import type { Capacity } from "@/lib/vocabulary/roles";
import { isAllowed } from "@/policies/authorize";
import { signingRights, type SigningRight } from "@/policies/signing-rights";
import { canMove, isOpen } from "../records/moves";
import { hasPart, proposalQuestion } from "../records/proposal-record";
import { isFilled, type RoundReview } from "../review/round-review";
import type { MoveView, ProposalMove } from "../views";

const HIDDEN: MoveView = { applies: false, allowed: false, because: null };
const OPEN: MoveView = { applies: true, allowed: true, because: null };

/** What the reader may do now. Shown only: every command asks again. */
export function moveViews(
  actor: Actor,
  review: RoundReview,
  unsettled: readonly number[],
): Record<ProposalMove, MoveView> {
  const { proposal, overtaken, today } = review;
  const { productId } = proposal;
  const when = (applies: boolean): MoveView => (applies ? OPEN : HIDDEN);
  const hasSigned = review.signatures.some(({ signerId, deputyForId }) =>
    [signerId, deputyForId].includes(actor.userId),
  );
  const mayEdit = !hasSigned && isAllowed(actor, proposalQuestion(proposal, actor, "edit")) && isOpen(proposal.state);
  const isProposed = canMove(proposal.state, "approve");
  const isSubmitted = proposal.round > 0 && isOpen(proposal.state);
  const mayShare = {
    on: "Draft",
    action: "share",
    productId,
    proposerId: proposal.proposerId,
    isEditor: false,
  } as const;
  const reviewer = signingMove(actor, "reviewer", review, unsettled);
  const manager = signingMove(actor, "program_manager", review, unsettled);
  const signs = isProposed && mayReturn(actor, review);
  return {
    edit: when(mayEdit),
    share: when(isAllowed(actor, mayShare) && isOpen(proposal.state)),
    propose: when(mayEdit),
    withdraw: when(
      canMove(proposal.state, "withdraw") && isAllowed(actor, proposalQuestion(proposal, actor, "withdraw")),
    ),
    carry_forward: when(mayEdit && overtaken.length > 0 && proposal.baseIssue < today.issue),
    sign_as_reviewer: isProposed ? reviewer : HIDDEN,
    sign_as_program_manager: isProposed ? manager : HIDDEN,
    return: when(signs),
    disapprove: when(isProposed && hasRight(actor, "program_manager", review)),
    take_back: when(isProposed && review.approvals.some(({ signerId }) => signerId === actor.userId)),
    object: when(
      isProposed &&
        !signs &&
        !hasPart(proposal, actor.userId) &&
        isAllowed(actor, { on: "Product", action: "object", productId }),
    ),
    remark: when(isSubmitted && isAllowed(actor, { on: "Product", action: "remark", productId })),
    add_file: when(isSubmitted && isAllowed(actor, { on: "Product", action: "add_file", productId })),
    name_reviewer: when(isProposed && isAllowed(actor, { on: "Product", action: "assign_reviewer", productId })),
  };
}

/** For whom the reader may sign as a deputy today. */
export function deputyRights(actor: Actor, { signing }: RoundReview): SigningRight[] {
  const rights = [...signingRights("reviewer", signing), ...signingRights("program_manager", signing)];
  return rights.filter(({ userId, deputyFor }) => userId === actor.userId && deputyFor !== null);
}

function signingMove(actor: Actor, capacity: Capacity, review: RoundReview, unsettled: readonly number[]): MoveView {
  const { required, approvals, round, signing } = review;
  const needed = required.find((each) => each.capacity === capacity);
  const holdsRole = signing.members.some(({ userId, roles }) => userId === actor.userId && roles.includes(capacity));
  if (!needed || isFilled(needed, approvals, round)) return HIDDEN;
  if (approvals.some(({ signerId }) => signerId === actor.userId)) return HIDDEN;
  const barred = signing.barred.find(({ userId }) => userId === actor.userId);
  // Told also to who could not sign anyway: an owner asks why others sign what is theirs.
  if (barred) return refused(`Nobody signs their own change: you are barred ${barred.because}.`);
  if (!hasRight(actor, capacity, review)) {
    const named = signing.namedReviewerId === null ? null : review.people.get(signing.namedReviewerId);
    return holdsRole && named ? refused(`${named} is named as the reviewer here.`) : HIDDEN;
  }
  const obstacle = obstacleTo(review, unsettled);
  return obstacle === null ? OPEN : refused(obstacle);
}

function obstacleTo({ overtaken, obstacles }: RoundReview, unsettled: readonly number[]): string | null {
  if (unsettled.length > 0) {
    return `No approval is taken while a remark asks for action: ${unsettled.map((number) => `R${number}`).join(", ")}.`;
  }
  if (overtaken.length > 0) return "It was overtaken: no approval is taken until it is carried forward.";
  const [obstacle] = obstacles;
  return obstacle === undefined ? null : `Today's issue cannot take it. ${obstacle}`;
}

function hasRight(actor: Actor, capacity: Capacity, { signing }: RoundReview): boolean {
  return signingRights(capacity, signing).some(({ userId }) => userId === actor.userId);
}

/** A return stays open to every signer, also where one reviewer is named. */
function mayReturn(actor: Actor, review: RoundReview): boolean {
  const open = { ...review, signing: { ...review.signing, namedReviewerId: null } };
  return hasRight(actor, "reviewer", open) || hasRight(actor, "program_manager", open);
}

function refused(because: string): MoveView {
  return { applies: true, allowed: false, because };
}

import type { RoutedCapacity } from "@/policies/approval-routing";
import { signingRights } from "@/policies/signing-rights";
import { isFilled, type RoundReview } from "../review/round-review";
import type { SignatureRecord } from "../records/signature-records";
import type { CapacityView, PersonView, RoutingView, SignatureView } from "../views";

/** What must sign and why, who filled it, who may, and which role is missing. */
export function routingView(review: RoundReview): RoutingView {
  const { routing, signing, people } = review;
  const signatures = signatureViews(review);
  return {
    capacities: routing.map((capacity) => capacityView(capacity, review, signatures)),
    barred: signing.barred
      .filter(({ userId }) => signing.members.some((member) => member.userId === userId))
      .map(({ userId, because }) => ({ person: personOf(people, userId), because })),
  };
}

/** All signatures, of earlier rounds too, oldest first; each says whether it counts and why not. */
export function signatureViews(review: RoundReview): SignatureView[] {
  const { signatures, approvals, people, round } = review;
  const takenBack = new Set(signatures.map(({ takesBackId }) => takesBackId));
  const views = signatures.map((signature) => {
    const counts =
      approvals.some(({ id }) => id === signature.id) || (signature.roundId === round.id && isDecision(signature));
    return signatureView(signature, people, counts ? null : whyNot(signature, round.number, takenBack));
  });
  return [...(round.isSubmittedByManager && round.id > 0 ? [signedBySubmitting(review)] : []), ...views];
}

function capacityView(
  capacity: RoutedCapacity,
  { approvals, round, signing, people }: RoundReview,
  signatures: readonly SignatureView[],
): CapacityView {
  const filled = isFilled(capacity, approvals, round);
  const named = capacity.capacity === "reviewer" ? signing.namedReviewerId : null;
  const counting = signatures.filter((each) => each.counts && each.decision === "approve");
  const free = capacity.maySign.filter(({ deputyFor, userId }) => {
    return deputyFor === null && !counting.some(({ signer }) => signer.id === userId);
  });
  return {
    capacity: capacity.capacity,
    required: true,
    reasons: capacity.reasons.map(({ sentence }) => sentence),
    filledBy: filled ? (counting.find((each) => each.capacity === capacity.capacity) ?? null) : null,
    maySign: free.map(({ userId, printedName }) => ({ id: userId, name: printedName })),
    named: named === null ? null : personOf(people, named),
    couldName: signingRights(capacity.capacity, { ...signing, namedReviewerId: null })
      .filter(({ deputyFor }) => deputyFor === null)
      .map(({ userId, printedName }) => ({ id: userId, name: printedName })),
    missing: filled ? null : capacity.missing,
  };
}

function signatureView(
  signature: SignatureRecord,
  people: ReadonlyMap<number, string>,
  becauseNot: string | null,
): SignatureView {
  const { id, round, capacity, decision, meaning, reason, printedName, signedAt, hash } = signature;
  const deputyFor =
    signature.deputyForId === null ? null : { id: signature.deputyForId, name: signature.deputyForName ?? "" };
  return {
    ...{ id, round, capacity, decision, meaning, reason, printedName, hash, deputyFor, becauseNot },
    signer: personOf(people, signature.signerId),
    at: signedAt,
    counts: becauseNot === null,
  };
}

function isDecision({ decision }: SignatureRecord): boolean {
  return decision === "return" || decision === "disapprove";
}

function whyNot(
  { id, round, decision }: SignatureRecord,
  current: number,
  takenBack: ReadonlySet<number | null>,
): string {
  if (takenBack.has(id)) return "taken back";
  if (decision === "take_back") return "takes an approval back";
  return round === current ? "no longer stands" : `belongs to round ${round}`;
}

/** A program manager who submits what only transfers or regroups signs that capacity by submitting it. */
function signedBySubmitting({ round, people }: RoundReview): SignatureView {
  const signer = personOf(people, round.submittedById);
  return {
    ...{ id: -round.id, round: round.number, capacity: "program_manager", decision: "approve", signer },
    ...{ meaning: "Signed by submitting it", reason: null, deputyFor: null, counts: true, becauseNot: null },
    printedName: signer.name,
    at: round.submittedAt,
    hash: round.hash,
  };
}

export function personOf(people: ReadonlyMap<number, string>, id: number): PersonView {
  return { id, name: people.get(id) ?? "" };
}

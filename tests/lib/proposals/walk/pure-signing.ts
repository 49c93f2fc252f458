import { ownersOfEdits, releasedGrowth } from "@/lib/budget/routing-facts";
import { stateAfter, type Move } from "@/lib/proposals/records/moves";
import { overtakenReasons } from "@/lib/proposals/review/overtaken";
import type { BudgetAtIssue } from "@/lib/proposals/review/preview-proposal";
import { sameValue } from "@/lib/proposals/records/same-value";
import type { DraftContent } from "@/lib/proposals/schema";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Capacity } from "@/lib/vocabulary/roles";
import { grownRouting, type RequiredCapacity } from "@/policies/approval-routing";
import { authorize } from "@/policies/authorize";
import { barredPersons, demandIndependence } from "@/policies/independence";
import { signingRights } from "@/policies/signing-rights";
import { issueAt, newest, PRODUCT, refuse, type Approved, type Memory, type Proposal } from "./pure-memory";
import { previewOn } from "./pure-submission";

/** The open round for somebody who may sign it: the role first, then the state, then independence. */
function openRound(desk: Memory, actor: Actor, proposal: Proposal, move: Move, capacity: Capacity) {
  const action = move === "disapprove" ? "disapprove" : (`sign_as_${capacity}` as const);
  authorize(actor, { on: "Round", action, productId: PRODUCT, asDeputy: false });
  const { round } = proposal;
  stateAfter(proposal.state, move);
  if (!round) return refuse("wrong_state");
  const [base, today] = [issueAt(desk, round.base), newest(desk)];
  const onToday = previewOn(desk, today, round.content, round.isSubmittedByManager);
  const onBase = previewOn(desk, base, round.content, round.isSubmittedByManager);
  const { edits } = round.content;
  const owners = [
    ...ownersOfEdits(edits, base.state, onBase.change.after.state),
    ...ownersOfEdits(edits, today.state, onToday.change.after.state),
  ];
  const editorIds = [...proposal.editorIds, round.submitterId];
  const barred = barredPersons({ proposerId: proposal.proposerId, editorIds, owners });
  demandIndependence(actor.userId, null, barred);
  const rights = signingRights(capacity, { members: desk.members, deputies: [], barred, namedReviewerId: null });
  if (!rights.some(({ userId }) => userId === actor.userId)) refuse("forbidden");
  return { round, base, today, onToday, required: grownRouting(round.required, onToday.routing) };
}

function signed({ signerIds }: Proposal, { userId }: Actor): void {
  if (!signerIds.includes(userId)) signerIds.push(userId);
}

export function approve(desk: Memory, actor: Actor, proposal: Proposal, capacity: Capacity): void {
  const { round, base, today, onToday, required } = openRound(desk, actor, proposal, "approve", capacity);
  if (round.approvals.some(({ signerId }) => signerId === actor.userId)) refuse("capacity_taken");
  const isFilled = ({ capacity: asked, count, signedBySubmitting }: RequiredCapacity) =>
    (signedBySubmitting && round.isSubmittedByManager) ||
    round.approvals.filter((approval) => approval.capacity === asked).length >= count;
  const needed = required.find((each) => each.capacity === capacity);
  if (!needed || isFilled(needed)) refuse("capacity_taken");
  if (proposal.requests.some(({ settled }) => !settled)) refuse("unsettled_request");
  if (overtakenReasons(base.state, today.state, round.content.edits).length > 0) refuse("overtaken");
  if (onToday.obstacles.length > 0) refuse("conservation");

  round.required = required;
  round.approvals.push({ signerId: actor.userId, capacity });
  signed(proposal, actor);
  if (!required.every(isFilled)) return;
  proposal.state = stateAfter(proposal.state, "approve");
  const after = { issue: today.issue + 1, ...onToday.change.after };
  const isManagers = round.isSubmittedByManager || round.approvals.some((each) => each.capacity === "program_manager");
  desk.moves.push(...movesBetween(today, after, round.content, isManagers, desk.now));
  desk.issues.push(after);
}

function movesBetween(
  before: BudgetAtIssue,
  after: BudgetAtIssue,
  { edits }: DraftContent,
  programManagerSigned: boolean,
  at: number,
): Approved[] {
  return after.results.points.flatMap(({ operatingPoint, items }) =>
    items.flatMap((result): Approved[] => {
      const was = before.results.points.find((point) => point.operatingPoint === operatingPoint)?.items;
      const earlier = was?.find(({ item }) => item === result.item);
      if (!edits.some(({ kind, number }) => kind === "item" && number === result.item)) return [];
      if (earlier && sameValue(earlier, result)) return [];
      const released = releasedGrowth(result.item, before, after).find(
        (each) => each.operatingPoint === operatingPoint,
      );
      const predicted = result.predicted - (earlier?.predicted ?? 0);
      const { item } = result;
      const { issue } = after;
      return [{ item, operatingPoint, issue, predicted, released: released?.released ?? 0, programManagerSigned, at }];
    }),
  );
}

export function decide(
  desk: Memory,
  actor: Actor,
  proposal: Proposal,
  move: "return" | "disapprove",
  capacity: Capacity,
): void {
  openRound(desk, actor, proposal, move, capacity);
  signed(proposal, actor);
  proposal.state = stateAfter(proposal.state, move);
}

export function takeBack(desk: Memory, actor: Actor, proposal: Proposal): void {
  authorize(actor, { on: "Signature", action: "take_back", productId: PRODUCT, signerId: actor.userId });
  stateAfter(proposal.state, "approve");
  const { round } = proposal;
  const own = round?.approvals.findIndex(({ signerId }) => signerId === actor.userId) ?? -1;
  if (!round || own < 0) return refuse("wrong_state");
  const now = previewOn(desk, newest(desk), round.content, round.isSubmittedByManager).routing;
  round.required = grownRouting(round.required, now);
  round.approvals.splice(own, 1);
}

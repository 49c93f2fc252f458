import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import { authorizeChange } from "@/lib/proposals/drafting/authorize-change";
import { isOpen, stateAfter, wrongStateSentence } from "@/lib/proposals/records/moves";
import { overtakenReasons } from "@/lib/proposals/review/overtaken";
import { previewProposal, type BudgetAtIssue } from "@/lib/proposals/review/preview-proposal";
import { sameValue } from "@/lib/proposals/records/same-value";
import { DraftEdit, type DraftContent } from "@/lib/proposals/schema";
import { carriedEdits, settledEdit } from "@/lib/proposals/review/settlement";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { authorize } from "@/policies/authorize";
import type { Member } from "@/policies/signing-rights";
import { DAY_MS, issueAt, newest, nobody, PRODUCT, refuse, type Memory, type Proposal } from "./pure-memory";

export function questionOf(proposal: Proposal, { userId }: Actor, action: "edit" | "propose" | "withdraw") {
  const { rounds, proposerId, coEditorIds } = proposal;
  const isEditor = coEditorIds.includes(userId);
  return { on: rounds === 0 ? "Draft" : "Proposal", action, productId: PRODUCT, proposerId, isEditor } as const;
}

export function demandOpen({ state }: Proposal): void {
  if (!isOpen(state)) throw new Refusal("wrong_state", wrongStateSentence(state));
}

function noteEditor({ editorIds, signerIds }: Proposal, { userId }: Actor): void {
  if (signerIds.includes(userId)) refuse("not_independent");
  if (!editorIds.includes(userId)) editorIds.push(userId);
}

export function start(desk: Memory, actor: Actor): void {
  authorize(actor, { on: "Product", action: "start_draft", productId: PRODUCT });
  const copy = { title: "A walk", reason: "At random.", neededBy: null, edits: [], transfers: [] };
  desk.proposals.push({
    ...{ state: "draft", proposerId: actor.userId, coEditorIds: [], editorIds: [actor.userId], signerIds: [], copy },
    ...{ base: newest(desk).issue, rounds: 0, round: null, requests: [] },
  });
}

export function save(desk: Memory, actor: Actor, proposal: Proposal, content: DraftContent): void {
  authorize(actor, questionOf(proposal, actor, "edit"));
  demandOpen(proposal);
  const { copy } = proposal;
  const fresh = {
    edits: content.edits.filter((edit) => !copy.edits.some((old) => sameValue(old, edit))),
    transfers: content.transfers.filter((transfer) => !copy.transfers.some((old) => sameValue(old, transfer))),
  };
  authorizeChange(actor, [actor], { productId: PRODUCT, state: newest(desk).state }, fresh, content.edits);
  const lines = content.edits.map(({ kind, number }) => `${kind} ${number}`);
  if (new Set(lines).size < lines.length) refuse("invalid");
  noteEditor(proposal, actor);
  proposal.copy = content;
}

export function propose(desk: Memory, actor: Actor, proposal: Proposal): void {
  authorize(actor, questionOf(proposal, actor, "propose"));
  stateAfter(proposal.state, proposal.state === "proposed" ? "revise" : "propose");
  submit(desk, actor, proposal, false);
}

function submit(desk: Memory, actor: Actor, proposal: Proposal, isCarried: boolean): void {
  const { copy, round, state, proposerId, coEditorIds } = proposal;
  const base = newest(desk);
  const editors = desk.actors.filter(({ userId }) => [proposerId, ...coEditorIds].includes(userId));
  authorizeChange(actor, [actor, ...editors], { productId: PRODUCT, state: base.state }, copy);
  if (overtakenReasons(issueAt(desk, proposal.base).state, base.state, copy.edits).length > 0) refuse("overtaken");
  const isManager = actor.memberships.some(({ role }) => role === "program_manager");
  const { obstacles, routing } = previewOn(desk, base, copy, isManager);
  const [obstacle] = obstacles;
  if (obstacle) refuse(obstacle.code);
  if (state === "proposed" && round?.base === base.issue && sameValue(round.content, copy)) refuse("invalid");
  const isSubmittedByManager = !isCarried && routing.some(({ signedBySubmitting }) => signedBySubmitting);
  const required = isManager && !isSubmittedByManager ? previewOn(desk, base, copy, false).routing : routing;
  noteEditor(proposal, actor);
  proposal.round = {
    ...{ content: copy, base: base.issue, submitterId: actor.userId, isSubmittedByManager, required, approvals: [] },
  };
  proposal.state = stateAfter(state, state === "proposed" ? "revise" : "propose");
  proposal.base = base.issue;
  proposal.rounds += 1;
}

export function previewOn(desk: Memory, budget: BudgetAtIssue, content: DraftContent, isSubmittedByManager: boolean) {
  const rules = termsOf(budget.state).reviewRules;
  const since = desk.now - rules.programManagerOn.windowDays * DAY_MS;
  const earlierMoves = desk.moves.filter(({ at }) => at > since);
  return previewProposal(budget, content, { rules, earlierMoves, isSubmittedByManager });
}

export function share(actor: Actor, proposal: Proposal, userId: number, members: readonly Member[]): void {
  const { proposerId, coEditorIds, signerIds } = proposal;
  authorize(actor, { on: "Draft", action: "share", productId: PRODUCT, proposerId, isEditor: false });
  demandOpen(proposal);
  const roles = members.find((member) => member.userId === userId)?.roles ?? [];
  if (!roles.includes("component_owner") && !roles.includes("program_manager")) refuse("invalid");
  if (userId === proposerId) refuse("invalid");
  if (coEditorIds.includes(userId)) return;
  if (signerIds.includes(userId)) refuse("invalid");
  coEditorIds.push(userId);
}

export function settle(desk: Memory, actor: Actor, proposal: Proposal, number: number): void {
  const request = proposal.requests[number] ?? nobody();
  const { proposerId, coEditorIds, editorIds, round } = proposal;
  const lines = newest(desk).state.lines;
  const isOwner = (round?.content.edits ?? []).some(({ kind, number: line, body }) => {
    const today = lines.find((each) => each.kind === "item" && each.number === line);
    const owners = [body?.ownerId, today?.kind === "item" ? today.body.ownerId : null];
    return kind === "item" && owners.includes(actor.userId);
  });
  const hasPart = isOwner || [proposerId, ...coEditorIds, ...editorIds].includes(actor.userId);
  const { authorId } = request;
  authorize(actor, { on: "Remark", action: "settle", productId: PRODUCT, authorId, hasPart });
  demandOpen(proposal);
  if (request.settled) refuse("wrong_state");
  request.settled = true;
}

export function carry(desk: Memory, actor: Actor, proposal: Proposal, side: "base" | "theirs" | "yours"): void {
  authorize(actor, questionOf(proposal, actor, "edit"));
  demandOpen(proposal);
  const [base, onto] = [issueAt(desk, proposal.base), newest(desk)];
  if (base.issue === onto.issue) refuse("wrong_state");
  const carried = carriedEdits(base.state, onto.state, proposal.copy.edits);
  if (carried.some(({ obstacle }) => obstacle !== null)) refuse("overtaken");
  const edits = carried.map((each) => {
    const choices = new Map(each.merges.map(({ field }) => [field, side] as const));
    return DraftEdit.parse(settledEdit(each, choices));
  });
  noteEditor(proposal, actor);
  proposal.copy = { ...proposal.copy, edits };
  proposal.base = onto.issue;
  if (proposal.state === "proposed") submit(desk, actor, proposal, true);
}

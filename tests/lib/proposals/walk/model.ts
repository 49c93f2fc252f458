import {
  applied,
  fieldOf,
  lineOf,
  predictedOf,
  revisionOf,
  type ModelBudget,
  type ModelContent,
  type ModelEdit,
} from "./model-budget";
import { managerIsAsked } from "./model-routing";
import { issueOf, newest, ROLES, type Model, type ModelCapacity, type ModelProposal } from "./model-state";

/** What an act does when it is allowed; null where it is refused. */
export type Allowed = (() => void) | null;

const is = (who: string, role: "owner" | "reviewer" | "manager") => ROLES[who]?.includes(role) === true;
const takesPart = (who: string) => ROLES[who]?.some((role) => role !== "auditor") === true;
const maySubmit = (who: string) => is(who, "owner") || is(who, "manager");
const isOpen = ({ state }: ModelProposal) => state === "draft" || state === "proposed" || state === "returned";
const edits = (who: string, { proposer, coEditors }: ModelProposal) =>
  maySubmit(who) && (who === proposer || coEditors.includes(who));

export function start(model: Model, who: string): Allowed {
  if (!maySubmit(who)) return null;
  return () => {
    model.proposals.push({
      ...{ state: "draft", proposer: who, coEditors: [], editors: [who], signers: [], base: model.issues.length },
      ...{ copy: { edits: [], transfers: [] }, everTyped: [], rounds: 0, round: null, requests: [] },
    });
  };
}

export function save(model: Model, who: string, proposal: ModelProposal, content: ModelContent): Allowed {
  const { copy, signers } = proposal;
  if (!edits(who, proposal) || !isOpen(proposal) || signers.includes(who)) return null;
  const lines = content.edits.map(lineOf);
  if (new Set(lines).size < lines.length) return null;
  const known = [...copy.edits, ...copy.transfers].map((each) => JSON.stringify(each));
  const isNew = (each: object) => !known.includes(JSON.stringify(each));
  const fresh = { edits: content.edits.filter(isNew), transfers: content.transfers.filter(isNew) };
  if (!mayAsk(model, [who], fresh, content)) return null;
  return () => {
    proposal.copy = content;
    for (const edit of content.edits) if (edit.what === "add") addTo(proposal.everTyped, edit.item);
    addTo(proposal.editors, who);
  };
}

export function propose(model: Model, who: string, proposal: ModelProposal): Allowed {
  if (!edits(who, proposal) || !isOpen(proposal) || proposal.signers.includes(who)) return null;
  return submission(model, who, proposal, { content: proposal.copy, base: proposal.base, carried: false });
}

interface Submitted {
  content: ModelContent;
  base: number;
  carried: boolean;
}

function submission(
  model: Model,
  who: string,
  proposal: ModelProposal,
  { content, base, carried }: Submitted,
): Allowed {
  const today = newest(model);
  const editors = [who, proposal.proposer, ...proposal.coEditors];
  if (!mayAsk(model, editors, content, content) || isOvertaken(model, base, content)) return null;
  const after = applied(today, content);
  const { round } = proposal;
  const isRepeated =
    proposal.state === "proposed" &&
    round?.base === model.issues.length &&
    JSON.stringify(round.content) === JSON.stringify(content);
  if (!after || isRepeated) return null;

  const asks = managerIsAsked(model, today, after, content);
  const signedBySubmitting =
    !carried && is(who, "manager") && asks.forAllocations && !asks.forMore && regroups(content);
  return () => {
    proposal.round = {
      ...{ content, base: model.issues.length, submitter: who, approvals: [], signedBySubmitting },
      asksManager: asks.forAllocations || asks.forMore,
    };
    Object.assign(proposal, {
      state: "proposed",
      copy: content,
      base: model.issues.length,
      rounds: proposal.rounds + 1,
    });
    addTo(proposal.editors, who);
  };
}

const REGROUPING: readonly string[] = ["group", "parent"];
function regroups(content: ModelContent): boolean {
  return content.edits.every(({ what }) => REGROUPING.includes(what));
}

export function approve(model: Model, who: string, proposal: ModelProposal, capacity: ModelCapacity): Allowed {
  const { round, requests } = proposal;
  if (!round || !maySign(model, who, proposal, capacity)) return null;
  if (round.approvals.some((approval) => approval.who === who)) return null;
  const after = applied(newest(model), round.content);
  if (!after || isOvertaken(model, round.base, round.content) || requests.some(({ settled }) => !settled)) return null;
  const asks = managerIsAsked(model, newest(model), after, round.content);
  const asksManager = round.asksManager || asks.forAllocations || asks.forMore;
  const has = (each: ModelCapacity) =>
    (each === "program_manager" && round.signedBySubmitting) ||
    round.approvals.some((approval) => approval.capacity === each);
  if (has(capacity) || (capacity === "program_manager" && !asksManager)) return null;
  return () => {
    round.asksManager = asksManager;
    round.approvals.push({ who, capacity });
    addTo(proposal.signers, who);
    if (!has("reviewer") || (asksManager && !has("program_manager"))) return;
    proposal.state = "approved";
    makeIssue(model, after, round.content, has("program_manager"));
  };
}

export function sendBack(model: Model, who: string, proposal: ModelProposal, capacity: ModelCapacity): Allowed {
  if (!maySign(model, who, proposal, capacity)) return null;
  return () => {
    proposal.state = "returned";
    addTo(proposal.signers, who);
  };
}

export function disapprove(model: Model, who: string, proposal: ModelProposal): Allowed {
  if (!maySign(model, who, proposal, "program_manager")) return null;
  return () => {
    proposal.state = "disapproved";
    addTo(proposal.signers, who);
  };
}

export function takeBack(model: Model, who: string, { state, round }: ModelProposal): Allowed {
  const own = round?.approvals.findIndex((approval) => approval.who === who) ?? -1;
  if (!round || state !== "proposed" || own < 0) return null;
  return () => {
    const after = applied(newest(model), round.content);
    const asks = after && managerIsAsked(model, newest(model), after, round.content);
    if (asks && (asks.forAllocations || asks.forMore)) round.asksManager = true;
    round.approvals.splice(own, 1);
  };
}

export function withdraw(who: string, proposal: ModelProposal): Allowed {
  const isManagers = is(who, "manager") && proposal.rounds > 0;
  if (!isOpen(proposal) || (who !== proposal.proposer && !isManagers)) return null;
  return () => void (proposal.state = "withdrawn");
}

export function share(who: string, proposal: ModelProposal, to: string): Allowed {
  const { proposer, coEditors, signers } = proposal;
  if (who !== proposer || !isOpen(proposal) || !maySubmit(to) || to === proposer) return null;
  if (!coEditors.includes(to) && signers.includes(to)) return null;
  return () => addTo(coEditors, to);
}

export function ask(who: string, proposal: ModelProposal): Allowed {
  if (!takesPart(who) || proposal.rounds === 0 || !isOpen(proposal)) return null;
  return () => void proposal.requests.push({ author: who, settled: false });
}

export function object(who: string, { state }: ModelProposal): Allowed {
  return takesPart(who) && state === "proposed" ? () => undefined : null;
}

export function settle(model: Model, who: string, proposal: ModelProposal, number: number): Allowed {
  const request = proposal.requests[number];
  if (!request || request.settled || !isOpen(proposal)) return null;
  const { proposer, coEditors, editors, round } = proposal;
  const isOwner = (round?.content.edits ?? []).some((edit) =>
    [ownerIn(newest(model), edit), ...ownersTyped(edit)].includes(who),
  );
  const hasPart = isOwner || [proposer, ...coEditors, ...editors].includes(who);
  if (who !== request.author && (!is(who, "manager") || hasPart)) return null;
  return () => void (request.settled = true);
}

export type Side = "base" | "theirs" | "yours";

/** Brings the working copy onto the newest issue; where both sides changed the field, the chosen side stands. */
export function carry(model: Model, who: string, proposal: ModelProposal, side: Side): Allowed {
  const { base, copy, signers } = proposal;
  if (!edits(who, proposal) || !isOpen(proposal) || signers.includes(who) || base === model.issues.length) return null;
  if (copy.edits.some((edit) => cannotCarry(newest(model), edit))) return null;
  const carried = copy.edits.map((edit) => carriedEdit(issueOf(model, base), newest(model), edit, side));
  const content = { ...copy, edits: carried };
  if (proposal.state === "proposed") {
    return submission(model, who, proposal, { content, base: model.issues.length, carried: true });
  }
  return () => {
    Object.assign(proposal, { copy: content, base: model.issues.length });
    addTo(proposal.editors, who);
  };
}

function cannotCarry({ items }: ModelBudget, edit: ModelEdit): boolean {
  if (!("item" in edit) || edit.what === "add") return false;
  return items[edit.item]?.retired !== (edit.what === "reinstate");
}

function carriedEdit(base: ModelBudget, today: ModelBudget, edit: ModelEdit, side: Side): ModelEdit {
  if (!("to" in edit)) return edit;
  const [was, theirs, yours] = [fieldOf(base, edit), fieldOf(today, edit), edit.to];
  const both = was !== theirs && was !== yours && theirs !== yours;
  const to = was === yours ? theirs : both && side === "theirs" ? theirs : both && side === "base" ? was : yours;
  const owner = ownerIn(today, edit);
  const carried = { ...edit, to, ...("bodyOwner" in edit && owner !== undefined ? { bodyOwner: owner } : {}) };
  return carried as ModelEdit;
}

function maySign(model: Model, who: string, proposal: ModelProposal, capacity: ModelCapacity): boolean {
  const { state, round, proposer, editors } = proposal;
  if (!is(who, capacity === "reviewer" ? "reviewer" : "manager") || state !== "proposed" || !round) return false;
  const owners = round.content.edits.flatMap((edit) => [
    ownerIn(issueOf(model, round.base), edit),
    ownerIn(newest(model), edit),
    ...ownersTyped(edit),
  ]);
  return ![proposer, round.submitter, ...editors, ...owners].includes(who);
}

function ownerIn({ items }: ModelBudget, edit: ModelEdit): string | undefined {
  return "item" in edit ? items[edit.item]?.owner : undefined;
}

/** Owners that stand in what was typed. */
function ownersTyped(edit: ModelEdit): string[] {
  if (edit.what === "add") return [edit.body.owner];
  if (edit.what === "owner") return [edit.to];
  return "bodyOwner" in edit ? [edit.bodyOwner] : [];
}

/** Whether one of these may ask for each edit and transfer. */
function mayAsk(model: Model, who: string[], { edits, transfers }: ModelContent, all: ModelContent): boolean {
  if (who.some((each) => is(each, "manager"))) return true;
  const owners = who.filter((each) => is(each, "owner"));
  const ownerOf = (item: string | null) => {
    const added = all.edits.find((edit) => edit.what === "add" && edit.item === item);
    return newest(model).items[item ?? ""]?.owner ?? (added?.what === "add" ? added.body.owner : undefined);
  };
  const owns = (item: string | null) => owners.includes(ownerOf(item) ?? "");
  return (
    edits.every((edit) => "item" in edit && owns(edit.item)) &&
    transfers.every(({ giver, receiver }) =>
      [giver, receiver].some(({ kind, number }) => kind === "item" && owns(number)),
    )
  );
}

/** A line that it edits has another revision since. Transfers don't overtake each other. */
function isOvertaken(model: Model, base: number, { edits }: ModelContent): boolean {
  const [was, today] = [issueOf(model, base), newest(model)];
  return edits.some((edit) => revisionOf(was, lineOf(edit)) !== revisionOf(today, lineOf(edit)));
}

function makeIssue(model: Model, after: ModelBudget, { edits }: ModelContent, managerSigned: boolean): void {
  const before = newest(model);
  model.issues.push(after);
  for (const edit of edits) {
    if (!("item" in edit)) continue;
    const [was, now] = [before.items[edit.item], after.items[edit.item]];
    const by = (now ? predictedOf(now) : 0) - (was ? predictedOf(was) : 0);
    // What is retired has no result any more, and what changed only its owner or group has no new one.
    if (by === 0 || now?.retired) continue;
    model.moves.push({ item: edit.item, issue: model.issues.length, day: model.day, by, managerSigned });
  }
}

function addTo(list: string[], who: string): void {
  if (!list.includes(who)) list.push(who);
}

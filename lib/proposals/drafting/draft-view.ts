import { QueryTypes, type Transaction } from "sequelize";
import { newestIssue } from "@/lib/budget/load-budget";
import { membersAt, namesOf } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import type { LineKind } from "@/lib/vocabulary/lines";
import type { ProposalState } from "@/lib/vocabulary/proposals";
import { database } from "@/models/database";
import { keyOf, labelOf, type ProposalRecord } from "../records/proposal-record";
import type { PersonView } from "../views";
import { storedChange, touchedLines } from "../records/working-copy";
import type { DraftView } from "../workspace-views";

/** The working copy for one of its editors. */
export async function draftViewOf(
  actor: Actor,
  proposal: ProposalRecord,
  at: string,
  tx: Transaction,
): Promise<DraftView> {
  const names = new Map((await namesOf(proposal.productId, tx)).map(({ id, name }) => [id, name]));
  const person = (id: number): PersonView => ({ id, name: names.get(id) ?? "" });
  const members = await membersAt(proposal.productId, at, tx);
  const { title, reason, neededBy, proposerId, coEditorIds } = proposal;
  const last = await lastSave(proposal, tx);
  return {
    proposalId: proposal.id,
    key: keyOf(proposal),
    label: labelOf(proposal),
    productCode: proposal.productCode,
    state: proposal.state,
    lockVersion: proposal.lockVersion,
    savedAt: last.at,
    savedBy: person(last.userId),
    baseIssue: proposal.baseIssue,
    newestIssue: (await newestIssue(proposal.productId, tx)) ?? proposal.baseIssue,
    content: { title, reason, neededBy, ...(await storedChange({ proposalId: proposal.id }, tx)) },
    proposer: person(proposerId),
    coEditors: coEditorIds.map(person),
    couldCoEdit: members
      .filter(({ roles }) => roles.includes("component_owner") || roles.includes("program_manager"))
      .filter(({ userId }) => userId !== proposerId && !coEditorIds.includes(userId))
      .map(({ userId, printedName }) => ({ id: userId, name: printedName })),
    touched: [...(await touchedLines(proposal.id, tx))].flatMap(([line, fields]) =>
      Object.entries(fields).map(([field, { userId, at: when }]) => ({ line, field, by: person(userId), at: when })),
    ),
    touchedElsewhere: await touchedElsewhere(proposal, tx),
    warning: editingWarning(actor, proposal, members.find(({ userId }) => userId === actor.userId)?.roles ?? []),
  };
}

/** Told before the first keystroke to those who could otherwise sign. */
function editingWarning(actor: Actor, { editorIds }: ProposalRecord, roles: readonly string[]): string | null {
  const couldSign = roles.includes("reviewer") || roles.includes("program_manager");
  if (!couldSign || editorIds.includes(actor.userId)) return null;
  return "Whoever edits this proposal, however little, can never sign it.";
}

async function lastSave({ id, proposerId, createdAt }: ProposalRecord, tx: Transaction) {
  const [row] = await database.query<{ userId: number; at: string }>(
    `SELECT user_id AS userId, last_edit_at AS at FROM proposal_editors WHERE proposal_id = :id
     ORDER BY last_edit_at DESC, id DESC LIMIT 1`,
    { type: QueryTypes.SELECT, replacements: { id }, transaction: tx },
  );
  return row ?? { userId: proposerId, at: createdAt };
}

interface TouchedLine {
  kind: LineKind;
  number: string;
  /** null of a line that no issue has yet. */
  name: string | null;
  proposerId: number;
  state: ProposalState;
  proposalNumber: number | null;
}

/** Lines that others touch too. Of a draft they learn only that somebody's draft touches the line. */
export async function touchedElsewhere(
  proposal: ProposalRecord,
  tx: Transaction,
): Promise<DraftView["touchedElsewhere"]> {
  const names = new Map((await namesOf(proposal.productId, tx)).map(({ id, name }) => [id, name]));
  return (await othersLines(proposal, tx)).map(({ kind, number, name, proposerId, state, proposalNumber }) => ({
    line: { kind, number, name: name ?? "" },
    by: state === "draft" ? null : { id: proposerId, name: names.get(proposerId) ?? "" },
    state,
    number: proposalNumber,
  }));
}

function othersLines({ id, productId }: ProposalRecord, tx: Transaction): Promise<TouchedLine[]> {
  return database.query<TouchedLine>(
    `SELECT DISTINCT l.kind, l.number, (SELECT json_extract(r.body, '$.name') FROM line_revisions r
         WHERE r.line_id = l.id ORDER BY r.issue DESC LIMIT 1) AS name, p.proposer_id AS proposerId, p.state, p.number AS proposalNumber
     FROM proposal_edits mine
       JOIN proposal_edits theirs ON theirs.line_id = mine.line_id AND theirs.proposal_id <> mine.proposal_id
       JOIN lines l ON l.id = mine.line_id
       JOIN proposals p ON p.id = theirs.proposal_id
     WHERE mine.proposal_id = :id AND p.product_id = :productId AND p.state IN ('draft', 'proposed', 'returned')
     ORDER BY l.kind, l.number, p.id`,
    { type: QueryTypes.SELECT, replacements: { id, productId }, transaction: tx },
  );
}

import { QueryTypes, type Transaction } from "sequelize";
import type { ActSubject } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import { proposalLabel, type ProposalState } from "@/lib/vocabulary/proposals";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database } from "@/models/database";
import type { Question } from "@/policies/questions";

/** A proposal's own facts and who has a part in it. */
export interface ProposalRecord {
  id: number;
  productId: number;
  productCode: string;
  productName: string;
  number: number | null;
  title: string;
  reason: string;
  neededBy: string | null;
  state: ProposalState;
  round: number;
  baseIssue: number;
  proposerId: number;
  lockVersion: number;
  createdAt: string;
  endedAt: string | null;
  /** Named now by the proposer. */
  coEditorIds: number[];
  /** All who ever edited it. */
  editorIds: number[];
}

interface ProposalRow extends Omit<ProposalRecord, "coEditorIds" | "editorIds"> {
  coEditors: string;
  editors: string;
}

const SELECT_PROPOSALS = `SELECT p.id, p.product_id AS productId, d.code AS productCode,
    d.name AS productName, p.number, p.title, p.reason,
    p.needed_by AS neededBy, p.state, p.round, p.base_issue AS baseIssue, p.proposer_id AS proposerId,
    p.lock_version AS lockVersion, p.created_at AS createdAt, p.ended_at AS endedAt,
    (SELECT json_group_array(user_id) FROM proposal_coeditors WHERE proposal_id = p.id AND ended_at IS NULL) AS coEditors,
    (SELECT json_group_array(user_id) FROM proposal_editors WHERE proposal_id = p.id) AS editors
  FROM proposals p JOIN products d ON d.id = p.product_id`;

/** @throws Refusal "not_found" */
export async function proposalById(id: number, tx: Transaction): Promise<ProposalRecord> {
  const [row] = await rows("p.id = :value", id, tx);
  if (!row) throw new Refusal("not_found", "There is no such proposal.");
  return row;
}

export function proposalsOf(productId: number, tx: Transaction): Promise<ProposalRecord[]> {
  return rows("p.product_id = :value", productId, tx);
}

/** By the key of its URL: the number, or "draft-17" before it has one. */
export async function proposalByKey(productId: number, key: string, tx: Transaction): Promise<ProposalRecord | null> {
  const [, draft, number] = /^(?:draft-([1-9]\d{0,8})|([1-9]\d{0,8}))$/.exec(key) ?? [];
  if (draft === undefined && number === undefined) return null;
  const condition = draft === undefined ? "p.number = :value" : "p.id = :value AND p.number IS NULL";
  const found = await rows(condition, Number(draft ?? number), tx);
  return found.find((proposal) => proposal.productId === productId) ?? null;
}

export function keyOf({ id, number }: Pick<ProposalRecord, "id" | "number">): string {
  return number === null ? `draft-${id}` : String(number);
}

export function labelOf({ id, number, productCode }: Pick<ProposalRecord, "id" | "number" | "productCode">): string {
  return number === null ? `Draft ${id}` : proposalLabel(productCode, number);
}

export function subjectOf(proposal: Pick<ProposalRecord, "id" | "number" | "productCode">): ActSubject {
  return { type: "proposal", id: String(proposal.id), label: labelOf(proposal) };
}

/** What was never submitted stays its editors' own, also after it was withdrawn. */
export function proposalQuestion(
  { productId, proposerId, coEditorIds, number }: ProposalRecord,
  actor: Pick<Actor, "userId">,
  action: "read" | "edit" | "propose" | "withdraw",
): Question {
  const isEditor = coEditorIds.includes(actor.userId);
  return { on: number === null ? "Draft" : "Proposal", action, productId, proposerId, isEditor };
}

/** Whether somebody proposed, edited or may edit it. */
export function hasPart({ proposerId, coEditorIds, editorIds }: ProposalRecord, userId: number): boolean {
  return proposerId === userId || coEditorIds.includes(userId) || editorIds.includes(userId);
}

async function rows(condition: string, value: number, tx: Transaction): Promise<ProposalRecord[]> {
  const found = await database.query<ProposalRow>(`${SELECT_PROPOSALS} WHERE ${condition} ORDER BY p.id`, {
    type: QueryTypes.SELECT,
    replacements: { value },
    transaction: tx,
  });
  return found.map(({ coEditors, editors, ...row }) => ({
    ...row,
    coEditorIds: ids(coEditors),
    editorIds: ids(editors),
  }));
}

function ids(json: string): number[] {
  const list: unknown = JSON.parse(json);
  return Array.isArray(list) ? list.filter((id) => typeof id === "number") : [];
}

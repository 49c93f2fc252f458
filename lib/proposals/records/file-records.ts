import { QueryTypes, type Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { database } from "@/models/database";
import { isAllowed } from "@/policies/authorize";
import { citedInRounds } from "./cited-files";
import { proposalQuestion, proposalsOf, type ProposalRecord } from "./proposal-record";

/** A file that a product holds, as its row says. */
export interface FileRecord {
  id: number;
  productId: number;
  place: "working_copy" | "proposal";
  proposalId: number;
  name: string;
  mediaType: string;
  size: number;
  sha256: string;
  sourceDate: string;
  addedById: number;
  addedBy: string;
  addedAt: string;
  voidedBy: string | null;
  voidedAt: string | null;
  voidReason: string | null;
}

const SELECT_FILES = `SELECT a.id, a.product_id AS productId, a.owner_type AS place, a.owner_id AS proposalId, a.name,
    a.media_type AS mediaType, a.size, a.sha256, a.source_date AS sourceDate, a.added_by_id AS addedById,
    u.name AS addedBy, a.added_at AS addedAt, v.name AS voidedBy, a.voided_at AS voidedAt, a.void_reason AS voidReason
  FROM attachments a JOIN users u ON u.id = a.added_by_id LEFT JOIN users v ON v.id = a.voided_by_id`;

export async function fileById(id: number, tx: Transaction): Promise<FileRecord | null> {
  const [row] = await database.query<FileRecord>(`${SELECT_FILES} WHERE a.id = :id`, {
    type: QueryTypes.SELECT,
    replacements: { id },
    transaction: tx,
  });
  return row ?? null;
}

/**
 * The files of a product that somebody may open, oldest first. What was added to a working copy is its editors' own
 * until a submitted round cites it; then it is every member's.
 */
export async function readableFiles(actor: Actor, productId: number, tx: Transaction): Promise<FileRecord[]> {
  const files = await database.query<FileRecord>(`${SELECT_FILES} WHERE a.product_id = :productId ORDER BY a.id`, {
    type: QueryTypes.SELECT,
    replacements: { productId },
    transaction: tx,
  });
  if (files.length === 0) return [];
  const cited = new Set((await citedInRounds(productId, tx)).map(({ sha256 }) => sha256));
  const proposals = new Map((await proposalsOf(productId, tx)).map((proposal) => [proposal.id, proposal]));
  return files.filter(({ place, sha256, proposalId }) => {
    return place === "proposal" || cited.has(sha256) || isEditor(actor, proposals.get(proposalId));
  });
}

/** One file of a content: in force rather than voided, then the oldest; null where the product holds none. */
export function fileOfContent(files: readonly FileRecord[], sha256: string): FileRecord | null {
  const same = files.filter((file) => file.sha256 === sha256);
  return same.find(({ voidedAt }) => voidedAt === null) ?? same[0] ?? null;
}

function isEditor(actor: Actor, proposal: ProposalRecord | undefined): boolean {
  if (!proposal) return false;
  return isAllowed(actor, proposalQuestion(proposal, actor, proposal.number === null ? "read" : "edit"));
}

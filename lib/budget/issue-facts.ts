import { QueryTypes, type Transaction } from "sequelize";
import { proposalLabel } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import { database } from "@/models/database";
import type { ProductRow } from "./load-budget";
import type { IssueFacts, IssueSignature } from "./views";

/** What is told of each issue: its proposal, who signed it, and the baselines on it; oldest first. */
export async function issueFactsOf(product: ProductRow, tx: Transaction): Promise<IssueFacts[]> {
  const [issues, signatures, baselines] = [
    await issueRows(product.id, tx),
    await signatureRows(product.id, tx),
    await baselineRows(product.id, tx),
  ];
  return issues.map((issue) => ({
    number: issue.number,
    at: issue.at,
    contentHash: issue.contentHash,
    proposal: proposalOf(issue, product.code),
    signatures: signatures.filter((signature) => signature.issue === issue.number).map(toSignature),
    baselines: baselines
      .filter((baseline) => baseline.issue === issue.number)
      .map(({ name, purpose, signedBy, at }) => ({ name, purpose, signedBy, at })),
  }));
}

interface IssueRow {
  number: number;
  at: string;
  contentHash: string;
  proposalNumber: number | null;
  title: string | null;
  proposerId: number | null;
  proposerName: string | null;
}

function issueRows(productId: number, tx: Transaction): Promise<IssueRow[]> {
  return database.query<IssueRow>(
    `SELECT i.number, i.made_at AS at, i.content_hash AS contentHash, p.number AS proposalNumber,
       r.title, u.id AS proposerId, u.name AS proposerName
     FROM issues i
       LEFT JOIN proposals p ON p.id = i.proposal_id
       LEFT JOIN rounds r ON r.proposal_id = p.id AND r.number = p.round
       LEFT JOIN users u ON u.id = p.proposer_id
     WHERE i.product_id = :productId ORDER BY i.number`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
}

function proposalOf(row: IssueRow, productCode: string): IssueFacts["proposal"] {
  const { proposalNumber, title, proposerId, proposerName } = row;
  if (proposalNumber === null || proposerId === null) return null;
  return {
    number: proposalNumber,
    label: proposalLabel(productCode, proposalNumber),
    title: title ?? "",
    proposer: { id: proposerId, name: proposerName ?? "" },
  };
}

interface SignatureRow {
  issue: number;
  capacity: Capacity;
  printedName: string;
  deputyFor: string | null;
  at: string;
}

/** Approvals that stand on the last round; a program manager who submitted what only transfers signed by submitting. */
function signatureRows(productId: number, tx: Transaction): Promise<SignatureRow[]> {
  return database.query<SignatureRow>(
    `SELECT 1 AS issue, capacity, printed_name AS printedName, deputy_for_name AS deputyFor, signed_at AS at
     FROM signatures WHERE product_id = :productId AND subject_type = 'establishment'
     UNION ALL
     SELECT i.number, s.capacity, s.printed_name, s.deputy_for_name, s.signed_at
     FROM issues i
       JOIN proposals p ON p.id = i.proposal_id
       JOIN rounds r ON r.proposal_id = p.id AND r.number = p.round
       JOIN signatures s ON s.round_id = r.id AND s.decision = 'approve'
     WHERE i.product_id = :productId AND NOT EXISTS (SELECT 1 FROM signatures t WHERE t.takes_back_id = s.id)
     UNION ALL
     SELECT i.number, r.submitted_as, u.name, NULL, r.submitted_at
     FROM issues i
       JOIN proposals p ON p.id = i.proposal_id
       JOIN rounds r ON r.proposal_id = p.id AND r.number = p.round AND r.submitted_as IS NOT NULL
       JOIN users u ON u.id = r.submitted_by_id
     WHERE i.product_id = :productId
     ORDER BY 1, 5`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
}

function toSignature({ capacity, printedName, deputyFor, at }: SignatureRow): IssueSignature {
  return { capacity, printedName, deputyFor, at };
}

interface BaselineRow {
  issue: number;
  name: string;
  purpose: string;
  signedBy: string;
  at: string;
}

function baselineRows(productId: number, tx: Transaction): Promise<BaselineRow[]> {
  return database.query<BaselineRow>(
    `SELECT b.issue, b.name, b.purpose, s.printed_name AS signedBy, b.made_at AS at
     FROM baselines b JOIN signatures s ON s.baseline_id = b.id
     WHERE b.product_id = :productId ORDER BY b.made_at`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
}

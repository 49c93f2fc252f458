import { QueryTypes, type Transaction } from "sequelize";
import type { Decision } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import { database } from "@/models/database";

/** A signature on any round of a proposal. */
export interface SignatureRecord {
  id: number;
  roundId: number;
  round: number;
  capacity: Capacity;
  decision: Decision;
  meaning: string | null;
  reason: string | null;
  signerId: number;
  printedName: string;
  deputyForId: number | null;
  deputyForName: string | null;
  takesBackId: number | null;
  signedAt: string;
  canonicalText: string;
  hash: string;
}

/** All signatures of a proposal, oldest first. */
export function signaturesOf(proposalId: number, tx: Transaction): Promise<SignatureRecord[]> {
  return database.query<SignatureRecord>(
    `SELECT s.id, s.round_id AS roundId, r.number AS round, s.capacity, s.decision, s.meaning, s.reason,
       s.signer_id AS signerId, s.printed_name AS printedName, s.deputy_for_id AS deputyForId,
       s.deputy_for_name AS deputyForName, s.takes_back_id AS takesBackId, s.signed_at AS signedAt,
       s.canonical_text AS canonicalText, s.hash
     FROM signatures s JOIN rounds r ON r.id = s.round_id
     WHERE r.proposal_id = :proposalId ORDER BY s.sequence`,
    { type: QueryTypes.SELECT, replacements: { proposalId }, transaction: tx },
  );
}

/** Approvals of a round that nobody took back. */
export function standingApprovals(signatures: readonly SignatureRecord[], roundId: number): SignatureRecord[] {
  const takenBack = new Set(signatures.map(({ takesBackId }) => takesBackId));
  return signatures.filter(
    ({ id, roundId: of, decision }) => of === roundId && decision === "approve" && !takenBack.has(id),
  );
}

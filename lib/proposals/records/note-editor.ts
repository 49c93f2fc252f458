import { QueryTypes, type Transaction } from "sequelize";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database } from "@/models/database";
import { ProposalEditor } from "@/models/proposal-editor";

/**
 * Who edits a proposal once is barred from signing it for good; the other way round, who has signed any of its rounds,
 * or for whom a deputy did, does not edit it: a signature is always another person's.
 */
export async function noteEditor(proposalId: number, userId: number, at: string, tx: Transaction): Promise<void> {
  const signed = await roundSignedBy(proposalId, userId, tx);
  if (signed !== null) {
    throw new Refusal("not_independent", `You signed round ${signed} of this proposal: who signs it does not edit it.`);
  }
  const known = await ProposalEditor.findOne({ where: { proposalId, userId }, transaction: tx });
  if (known) await known.update({ lastEditAt: at > known.lastEditAt ? at : known.lastEditAt }, { transaction: tx });
  else await ProposalEditor.create({ proposalId, userId, firstEditAt: at, lastEditAt: at }, { transaction: tx });
}

/** The newest round of a proposal that somebody signed, in their own right or by a deputy; null for none. */
export async function roundSignedBy(proposalId: number, userId: number, tx: Transaction): Promise<number | null> {
  const [row] = await database.query<{ round: number | null }>(
    `SELECT max(r.number) AS round FROM signatures s JOIN rounds r ON r.id = s.round_id
     WHERE r.proposal_id = :proposalId AND (s.signer_id = :userId OR s.deputy_for_id = :userId)`,
    { type: QueryTypes.SELECT, replacements: { proposalId, userId }, transaction: tx },
  );
  return row?.round ?? null;
}

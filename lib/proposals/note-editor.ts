import type { Transaction } from "sequelize";
import { ProposalEditor } from "@/models/proposal-editor";

/** Who edits a proposal once is barred from signing it for good. */
export async function noteEditor(proposalId: number, userId: number, at: string, tx: Transaction): Promise<void> {
  const known = await ProposalEditor.findOne({ where: { proposalId, userId }, transaction: tx });
  if (known) await known.update({ lastEditAt: at > known.lastEditAt ? at : known.lastEditAt }, { transaction: tx });
  else await ProposalEditor.create({ proposalId, userId, firstEditAt: at, lastEditAt: at }, { transaction: tx });
}

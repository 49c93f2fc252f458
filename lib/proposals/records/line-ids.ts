import { QueryTypes, type Transaction } from "sequelize";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import { database } from "@/models/database";
import { Line } from "@/models/line";
import type { DraftEdit } from "../schema";

/** Ids of all lines of a product, reserved ones too, by "kind number". */
export async function lineIds(productId: number, tx: Transaction): Promise<Map<string, number>> {
  const lines = await Line.findAll({ where: { productId }, transaction: tx });
  return new Map(lines.map(({ id, kind, number }) => [`${kind} ${number}`, id]));
}

/**
 * Reserves the numbers of lines that a draft adds for the first time. A number belongs to the proposal that adds it,
 * from its first draft on, and is never used again.
 */
export async function reserveLines(
  proposal: { id: number; productId: number },
  edits: readonly DraftEdit[],
  at: string,
  tx: Transaction,
): Promise<FieldFault[]> {
  const known = await lineIds(proposal.productId, tx);
  const taken = await linesOfOthers(proposal, tx);
  const faults: FieldFault[] = [];
  for (const [index, { operation, kind, number }] of edits.entries()) {
    const id = known.get(`${kind} ${number}`);
    const path = `edits.${index}.number`;
    if (operation !== "add") {
      if (id === undefined) faults.push({ path, sentence: `There is no line ${number} to ${operation}.` });
    } else if (id === undefined) {
      await Line.create({ productId: proposal.productId, kind, number, reservedAt: at }, { transaction: tx });
    } else if (taken.has(id)) {
      faults.push({ path, sentence: `${number} is taken, by a line or by another draft: choose another number.` });
    }
  }
  return faults;
}

/** Lines that have a revision, or that another proposal adds. */
async function linesOfOthers({ id, productId }: { id: number; productId: number }, tx: Transaction) {
  const rows = await database.query<{ lineId: number }>(
    `SELECT r.line_id AS lineId FROM line_revisions r WHERE r.product_id = :productId
     UNION SELECT e.line_id FROM proposal_edits e JOIN proposals p ON p.id = e.proposal_id
       WHERE p.product_id = :productId AND p.id <> :id AND e.operation = 'add'
     UNION SELECT e.line_id FROM round_edits e JOIN rounds r ON r.id = e.round_id JOIN proposals p ON p.id = r.proposal_id
       WHERE p.product_id = :productId AND p.id <> :id AND e.operation = 'add'`,
    { type: QueryTypes.SELECT, replacements: { id, productId }, transaction: tx },
  );
  return new Set(rows.map(({ lineId }) => lineId));
}

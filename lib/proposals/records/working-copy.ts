import { QueryTypes, type Transaction } from "sequelize";
import { z } from "zod";
import { canonicalJson } from "@/lib/audit/canonical-json";
import type { EditOperation, LineKind } from "@/lib/vocabulary/lines";
import { database } from "@/models/database";
import { ProposalEdit } from "@/models/proposal-edit";
import { ProposalTransfer } from "@/models/proposal-transfer";
import { lineIds } from "./line-ids";
import { DraftTransfer, type DraftEdit } from "../schema";
import { TouchedFields } from "./touched-fields";

export interface StoredChange {
  edits: DraftEdit[];
  transfers: DraftTransfer[];
}

/** Edits and transfers of the working copy, or of a round as it was submitted. */
export async function storedChange(
  of: { proposalId: number } | { roundId: number },
  tx: Transaction,
): Promise<StoredChange> {
  const [edits, transfers, owner, id] =
    "proposalId" in of
      ? (["proposal_edits", "proposal_transfers", "proposal_id", of.proposalId] as const)
      : (["round_edits", "round_transfers", "round_id", of.roundId] as const);
  const options = { type: QueryTypes.SELECT, replacements: { id }, transaction: tx } as const;
  const editRows = await database.query<EditRow>(
    `SELECT l.kind, l.number, e.operation, e.base_letter AS baseLetter, e.body
     FROM ${edits} e JOIN lines l ON l.id = e.line_id WHERE e.${owner} = :id ORDER BY e.position`,
    options,
  );
  const transferRows = await database.query<{ body: string }>(
    `SELECT body FROM ${transfers} WHERE ${owner} = :id ORDER BY position`,
    options,
  );
  return {
    edits: editRows.map(({ body, ...row }) => ({ ...row, body: StoredBody.parse(JSON.parse(body ?? "null")) })),
    transfers: transferRows.map(({ body }) => DraftTransfer.parse(JSON.parse(body))),
  };
}

/** Who touched which field of the working copy's lines, by "item 030". */
export async function touchedLines(proposalId: number, tx: Transaction): Promise<Map<string, TouchedFields>> {
  const rows = await database.query<{ key: string; touched: string }>(
    `SELECT l.kind || ' ' || l.number AS key, e.touched
     FROM proposal_edits e JOIN lines l ON l.id = e.line_id WHERE e.proposal_id = :proposalId`,
    { type: QueryTypes.SELECT, replacements: { proposalId }, transaction: tx },
  );
  return new Map(rows.map(({ key, touched }) => [key, TouchedFields.parse(JSON.parse(touched))]));
}

/**
 * Puts a new working copy in place of the old one; its new lines have to be reserved before. Who touched what stays as
 * it was unless told anew.
 */
export async function replaceWorkingCopy(
  proposal: { id: number; productId: number },
  { edits, transfers }: StoredChange,
  tx: Transaction,
  touchedNow?: ReadonlyMap<string, TouchedFields>,
): Promise<void> {
  const proposalId = proposal.id;
  const touched = touchedNow ?? (await touchedLines(proposalId, tx));
  await ProposalEdit.destroy({ where: { proposalId }, transaction: tx });
  await ProposalTransfer.destroy({ where: { proposalId }, transaction: tx });
  await ProposalEdit.bulkCreate(
    (await editRowsOf(proposal.productId, edits, tx)).map((row, at) => ({
      proposalId,
      ...row,
      touched: canonicalJson(touched.get(`${edits[at]?.kind} ${edits[at]?.number}`) ?? {}),
    })),
    { transaction: tx },
  );
  await ProposalTransfer.bulkCreate(
    transferRowsOf(transfers).map((row) => ({ proposalId, ...row })),
    { transaction: tx },
  );
}

/** Edits as rows: the line by its id, the body as canonical text. */
export async function editRowsOf(productId: number, edits: readonly DraftEdit[], tx: Transaction) {
  const ids = await lineIds(productId, tx);
  return edits.map(({ kind, number, operation, baseLetter, body }, position) => {
    const lineId = ids.get(`${kind} ${number}`);
    if (lineId === undefined) throw new Error(`No line is reserved for ${kind} ${number}.`);
    return { position, lineId, operation, baseLetter, body: body === null ? null : canonicalJson(body) };
  });
}

export function transferRowsOf(transfers: readonly DraftTransfer[]) {
  return transfers.map((transfer, position) => ({ position, body: canonicalJson(transfer) }));
}

interface EditRow {
  kind: LineKind;
  number: string;
  operation: EditOperation;
  baseLetter: string | null;
  body: string | null;
}

const StoredBody = z.record(z.string(), z.json()).nullable();

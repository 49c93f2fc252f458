import { Op, type Transaction } from "sequelize";
import { namesOf } from "@/lib/budget/members";
import { Attachment } from "@/models/attachment";
import { citationsIn } from "./cited-files";
import type { DraftEdit } from "../schema";

/** What a change rests on no longer: files that it cites and that were voided, a sentence each, with who and why. */
export async function voidedCitations(
  productId: number,
  edits: readonly DraftEdit[],
  tx: Transaction,
): Promise<string[]> {
  const cited = citationsIn(edits).flatMap(({ kind, number, citation: { file } }) =>
    file && kind === "item" ? [{ number, file }] : [],
  );
  if (cited.length === 0) return [];
  const sha256 = { [Op.in]: cited.map(({ file }) => file.sha256) };
  const rows = await Attachment.findAll({ where: { productId, sha256 }, order: ["id"], transaction: tx });
  const people = new Map((await namesOf(productId, tx)).map(({ id, name }) => [id, name]));
  return cited.flatMap(({ number, file }) => {
    const same = rows.filter((row) => row.sha256 === file.sha256);
    const [voided] = same.filter(({ voidedAt }) => voidedAt !== null);
    // The same content may be held in force by another row.
    if (!voided || same.some(({ voidedAt }) => voidedAt === null)) return [];
    const by = people.get(voided.voidedById ?? 0) ?? "";
    return [`${file.name}, cited for item ${number}, was voided by ${by}: “${voided.voidReason ?? ""}”`];
  });
}

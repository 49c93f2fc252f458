import type { Transaction } from "sequelize";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import type { Actor } from "@/lib/vocabulary/actor";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import { citationsIn, citationsOf, type LineCitation } from "../records/cited-files";
import { readableFiles, type FileRecord } from "../records/file-records";
import type { DraftEdit } from "../schema";

/** Files newly cited have to be there, in force, and named as they came; what the line cited before stays cited. */
export async function fileFaults(
  actor: Actor,
  { productId, edits, base }: { productId: number; edits: readonly DraftEdit[]; base: BudgetState },
  tx: Transaction,
): Promise<FieldFault[]> {
  const cited = citationsIn(edits).filter(({ citation }) => citation.file !== undefined);
  if (cited.length === 0) return [];
  const files = await readableFiles(actor, productId, tx);
  return cited.flatMap((each) => {
    const sentence = citedBefore(each, base) ? null : faultOf(each, files);
    return sentence === null ? [] : [{ path: `edits.${each.edit}.body.evidence.${each.entry}.file`, sentence }];
  });
}

function citedBefore({ kind, number, citation }: LineCitation, base: BudgetState): boolean {
  const line = base.lines.find((each) => each.kind === kind && each.number === number);
  return citationsOf(line?.body).some(
    (before) =>
      before.citation.file?.sha256 === citation.file?.sha256 && before.citation.file?.name === citation.file?.name,
  );
}

function faultOf({ citation: { file } }: LineCitation, files: readonly FileRecord[]): string | null {
  const held = files.filter(({ sha256, name }) => sha256 === file?.sha256 && name === file.name);
  if (held.length === 0) return `The product holds no file ${file?.name ?? ""} of this content. Add it again.`;
  const [voided] = held.filter(({ voidedAt }) => voidedAt !== null);
  if (!voided) return null;
  return `${voided.name} was voided by ${voided.voidedBy ?? ""}: “${voided.voidReason ?? ""}” Take it off, or add another.`;
}

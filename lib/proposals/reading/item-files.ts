import { QueryTypes } from "sequelize";
import { productByCode } from "@/lib/budget/load-budget";
import type { Actor } from "@/lib/vocabulary/actor";
import { database, inSnapshot } from "@/models/database";
import { authorize } from "@/policies/authorize";
import { citationsOf } from "../records/cited-files";
import { fileOfContent, readableFiles } from "../records/file-records";
import { fileView } from "./file-views";
import type { FileView } from "../views";

/** A file that an item cited, with the revision by which it came and the last one that still cites it. */
export interface ItemFile {
  file: FileView;
  document: string;
  revision: string;
  date: string;
  fromLetter: string;
  fromIssue: number;
  untilLetter: string;
}

/** Every file that any revision of the item cites up to an issue, in the order in which they came. */
export function itemFiles(actor: Actor, productCode: string, number: string, issue: number): Promise<ItemFile[]> {
  return inSnapshot(async (tx) => {
    const product = await productByCode(productCode, tx);
    authorize(actor, { on: "Product", action: "read_budget", productId: product.id });
    const revisions = await database.query<{ letter: string; issue: number; body: string }>(
      `SELECT r.letter, r.issue, r.body FROM line_revisions r JOIN lines l ON l.id = r.line_id
       WHERE l.product_id = :productId AND l.kind = 'item' AND l.number = :number AND r.issue <= :issue
       ORDER BY r.issue`,
      { type: QueryTypes.SELECT, replacements: { productId: product.id, number, issue }, transaction: tx },
    );
    const held = await readableFiles(actor, product.id, tx);
    const found = new Map<string, ItemFile>();
    for (const { letter, issue: fromIssue, body } of revisions) {
      for (const { citation } of citationsOf(JSON.parse(body))) {
        const { document, revision, date } = citation;
        const file = citation.file ? fileOfContent(held, citation.file.sha256) : null;
        if (!file) continue;
        const known = found.get(file.sha256);
        if (known) known.untilLetter = letter;
        else {
          const came = { document, revision, date, fromLetter: letter, fromIssue, untilLetter: letter };
          found.set(file.sha256, { file: fileView(actor, file), ...came });
        }
      }
    }
    return [...found.values()];
  });
}

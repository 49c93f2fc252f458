import { QueryTypes, type Transaction } from "sequelize";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import { database, inSnapshot } from "@/models/database";
import { comparedFields } from "./compared-fields";
import { issueFactsOf } from "./issue-facts";
import { type LineRow, toLineState } from "./load-budget";
import { readableProduct } from "./queries";
import type { ComparedField, IssueFacts } from "./views";

/** One finish of the catalogue that an issue added, revised, retired or reinstated. */
export interface CatalogueChange {
  finish: string;
  name: string;
  /** null where the finish was new. */
  letterWas: string | null;
  letterNow: string;
  moved: "retired" | "reinstated" | null;
  /** Only the fields that differ; all of them at the first. */
  fields: ComparedField[];
}

/** The catalogue as an issue left it: each issue that touches a finish is the next version. */
export interface CatalogueVersion {
  version: number;
  issue: IssueFacts;
  /** How many finishes may be chosen in it. */
  inForce: number;
  changes: CatalogueChange[];
}

/** Every version of a product's finish catalogue up to an issue, newest first. */
export function catalogueHistory(actor: Actor, productCode: string, until: number): Promise<CatalogueVersion[]> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const facts = new Map((await issueFactsOf(product, tx)).map((issue) => [issue.number, issue]));
    const revisions = await finishRevisions(product.id, until, tx);
    const { code, name, kind } = product;
    const names = nameBookOf({ product: { code, name, kind }, lines: revisions }, new Map());
    const held = new Map<string, LineState>();
    return [...new Set(revisions.map(({ issue }) => issue))]
      .map((number, index): CatalogueVersion => {
        const issue = facts.get(number);
        if (!issue) throw new Error(`Issue ${number} of ${code} is not there.`);
        const changes = revisions
          .filter((line) => line.issue === number)
          .map((line) => {
            const before = held.get(line.number);
            held.set(line.number, line);
            const fields = comparedFields(before ? { line: before, names } : null, { line, names });
            return changeOf(before, line, fields);
          });
        const inForce = [...held.values()].filter(({ retired }) => !retired).length;
        return { version: index + 1, issue, inForce, changes };
      })
      .reverse();
  });
}

function changeOf(before: LineState | undefined, now: LineState, fields: ComparedField[]): CatalogueChange {
  const name = now.kind === "finish" ? now.body.name : "";
  const retiring = now.retired && !before?.retired ? "retired" : null;
  const moved = !now.retired && before?.retired ? "reinstated" : retiring;
  return { finish: now.number, name, letterWas: before?.letter ?? null, letterNow: now.letter, moved, fields };
}

async function finishRevisions(productId: number, until: number, tx: Transaction): Promise<LineState[]> {
  const rows = await database.query<LineRow>(
    `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body
     FROM lines l JOIN line_revisions r ON r.line_id = l.id
     WHERE l.product_id = :productId AND l.kind = 'finish' AND r.issue <= :until
     ORDER BY r.issue, length(l.number), l.number`,
    { type: QueryTypes.SELECT, replacements: { productId, until }, transaction: tx },
  );
  return rows.map(toLineState);
}

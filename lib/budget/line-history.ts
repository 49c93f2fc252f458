import { QueryTypes } from "sequelize";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import type { LineKind } from "@/lib/vocabulary/lines";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database, inSnapshot } from "@/models/database";
import { comparedFields } from "./compared-fields";
import { issueFactsOf } from "./issue-facts";
import { linesAt, toLineState } from "./load-budget";
import { namesOf } from "./members";
import { readableProduct } from "./queries";
import type { LineRevisionView } from "./views";

/** Every revision of a line, newest first, each with what brought it and the fields that moved. */
export function lineHistory(
  actor: Actor,
  productCode: string,
  kind: LineKind,
  number: string,
): Promise<LineRevisionView[]> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const rows = await database.query<RevisionRow>(
      `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body
       FROM line_revisions r JOIN lines l ON l.id = r.line_id
       WHERE l.product_id = :productId AND l.kind = :kind AND l.number = :number ORDER BY r.issue`,
      { type: QueryTypes.SELECT, replacements: { productId: product.id, kind, number }, transaction: tx },
    );
    const newest = rows.at(-1);
    if (!newest) throw new Refusal("not_found", `There is no ${kind.replace("_", " ")} ${number} in this budget.`);
    const people = new Map((await namesOf(product.id, tx)).map((person) => [person.id, person.name]));
    // Lines keep their numbers for ever, so that today's names tell what an earlier body refers to.
    const issues = await issueFactsOf(product, tx);
    const lines = await linesAt(product.id, issues.length, tx);
    const names = nameBookOf(stateOf(product, lines), people);
    const facts = new Map(issues.map((issue) => [issue.number, issue]));
    const states = rows.map(toLineState);
    return states
      .flatMap((line, index): LineRevisionView[] => {
        const issue = facts.get(line.issue);
        const before = states[index - 1];
        const fields = comparedFields(before ? { line: before, names } : null, { line, names });
        return issue ? [{ letter: line.letter, retired: line.retired, issue, fields }] : [];
      })
      .reverse();
  });
}

interface RevisionRow {
  kind: LineKind;
  number: string;
  letter: string;
  issue: number;
  retired: number;
  body: string;
}

function stateOf({ code, name, kind }: BudgetState["product"], lines: readonly LineState[]): BudgetState {
  return { product: { code, name, kind }, lines };
}

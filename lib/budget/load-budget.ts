import { QueryTypes, type Transaction } from "sequelize";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import type { LineKind, ProductKind } from "@/lib/vocabulary/lines";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database } from "@/models/database";
import { assembleResults, parseTotals, type StoredResult } from "./stored-results";

export interface ProductRow {
  id: number;
  code: string;
  name: string;
  kind: ProductKind;
  timeZone: string;
}

/** A budget at one issue, for commands and pages alike: what the issue keeps, nothing computed anew. */
export interface LoadedBudget {
  product: ProductRow;
  issue: number;
  state: BudgetState;
  results: BudgetResults;
}

export async function productByCode(code: string, tx: Transaction): Promise<ProductRow> {
  return oneProduct("code = :key", code, tx);
}

export async function productById(id: number, tx: Transaction): Promise<ProductRow> {
  return oneProduct("id = :key", id, tx);
}

/** The number of the newest issue, or of the newest at that moment; null where there was none yet. */
export async function newestIssue(productId: number, tx: Transaction, at?: string): Promise<number | null> {
  const [row] = await database.query<{ number: number | null }>(
    `SELECT max(number) AS number FROM issues
     WHERE product_id = :productId AND (:at IS NULL OR made_at <= :at)`,
    { type: QueryTypes.SELECT, replacements: { productId, at: at ?? null }, transaction: tx },
  );
  return row?.number ?? null;
}

/** The budget as it stands at an issue: of every line and result the newest row at or before it. */
export async function loadBudget(productId: number, issue: number, tx: Transaction): Promise<LoadedBudget> {
  const product = await productById(productId, tx);
  const { code, name, kind } = product;
  const state: BudgetState = { product: { code, name, kind }, lines: await linesAt(productId, issue, tx) };
  const results = await resultsAt(productId, issue, state, tx);
  return { product, issue, state, results };
}

/** @throws Refusal "wrong_state" where the product was never established */
export async function loadNewestBudget(productId: number, tx: Transaction): Promise<LoadedBudget> {
  const issue = await newestIssue(productId, tx);
  if (issue === null) throw new Refusal("wrong_state", "This product has not been established yet.");
  return loadBudget(productId, issue, tx);
}

/** All lines with their revision at the issue, retired ones too, by kind and number. */
export async function linesAt(productId: number, issue: number, tx: Transaction): Promise<LineState[]> {
  const rows = await database.query<LineRow>(
    `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body
     FROM lines l JOIN line_revisions r ON r.line_id = l.id
     WHERE l.product_id = :productId
       AND r.issue = (SELECT max(issue) FROM line_revisions WHERE line_id = l.id AND issue <= :issue)
     ORDER BY l.kind, l.number`,
    { type: QueryTypes.SELECT, replacements: { productId, issue }, transaction: tx },
  );
  return rows.map(toLineState);
}

export interface LineRow {
  kind: LineKind;
  number: string;
  letter: string;
  issue: number;
  retired: number;
  body: string;
}

export function toLineState({ kind, number, letter, issue, retired, body }: LineRow): LineState {
  const parsed = parseBody(kind, JSON.parse(body));
  if (!parsed.ok) throw new Error(`The stored body of ${kind} ${number} at issue ${issue} is no body of its kind.`);
  return { number, letter, issue, retired: Boolean(retired), ...parsed.content };
}

async function resultsAt(
  productId: number,
  issue: number,
  state: BudgetState,
  tx: Transaction,
): Promise<BudgetResults> {
  const [totals] = await database.query<{ totals: string }>(
    "SELECT totals FROM issues WHERE product_id = :productId AND number = :issue",
    { type: QueryTypes.SELECT, replacements: { productId, issue }, transaction: tx },
  );
  if (!totals) throw new Refusal("not_found", `There is no issue ${issue} of this budget.`);
  const rows = await database.query<StoredResult>(
    `SELECT i.number AS item, p.number AS operatingPoint, r.method_version AS methodVersion, r.basic,
       r.growth_fraction AS growthFraction, r.growth, r.predicted, r.answer, r.notes
     FROM results r JOIN lines i ON i.id = r.item_id JOIN lines p ON p.id = r.operating_point_id
     WHERE r.product_id = :productId AND r.issue = (SELECT max(issue) FROM results
       WHERE item_id = r.item_id AND operating_point_id = r.operating_point_id AND issue <= :issue)`,
    { type: QueryTypes.SELECT, replacements: { productId, issue }, transaction: tx },
  );
  return assembleResults(state, parseTotals(totals.totals), rows);
}

async function oneProduct(condition: string, key: string | number, tx: Transaction): Promise<ProductRow> {
  const [row] = await database.query<ProductRow>(
    `SELECT id, code, name, kind, time_zone AS timeZone FROM products WHERE ${condition}`,
    { type: QueryTypes.SELECT, replacements: { key }, transaction: tx },
  );
  if (!row) throw new Refusal("not_found", "There is no such product.");
  return row;
}

import { QueryTypes, type Transaction } from "sequelize";
import { canonicalJson } from "@/lib/audit/canonical-json";
import { issueContentHash, type IssueContent } from "@/lib/audit/issue-content-hash";
import { lineRevisionHash } from "@/lib/audit/line-revision-hash";
import { chainHead } from "@/lib/audit/write-entry";
import type { BudgetResults, ItemResult } from "@/lib/evaluation/budget/results";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { database } from "@/models/database";
import { Issue } from "@/models/issue";
import { Line } from "@/models/line";
import { LineRevision } from "@/models/line-revision";
import { Result } from "@/models/result";
import { keepSheets } from "./kept-sheets";
import type { ProductRow } from "./load-budget";
import { textsToStore, totalsToStore } from "./stored-results";
import { uncertaintyToStore } from "./stored-uncertainty";

export interface IssueToWrite {
  product: ProductRow;
  /** null for issue 1, the establishing act. */
  proposalId: number | null;
  /** Time of the act; the issue is later than the one before it, whatever the clock says. */
  at: string;
  /** The lines that get a revision, as they then stand. */
  changedLines: readonly LineState[];
  /** Every line as it then stands. */
  state: BudgetState;
  /** Results of the newest issue; null for issue 1. */
  resultsBefore: BudgetResults | null;
  results: BudgetResults;
}

export interface WrittenIssue {
  number: number;
  madeAt: string;
  contentHash: string;
}

/**
 * Writes the next issue: revisions of the changed lines, the results that changed, totals, their uncertainty and content hash. The caller
 * has checked the change and puts number and content hash into the history entry of its act.
 */
export async function writeIssue(issue: IssueToWrite, tx: Transaction): Promise<WrittenIssue> {
  const { product, proposalId, results } = issue;
  const newest = await newestOf(product.id, tx);
  const number = newest.number + 1;
  const madeAt = later(issue.at, newest.madeAt);
  const revisions = issue.changedLines.map((line) => storedRevision(line, product.code));
  const rows = changedResults(issue.resultsBefore, results);
  const totals = canonicalJson(totalsToStore(results));
  const uncertain = uncertaintyToStore(issue.state, results);
  const uncertainty = canonicalJson(uncertain);
  const contentHash = issueContentHash({
    productCode: product.code,
    number,
    totals,
    uncertainty,
    revisions,
    results: rows,
  });
  const head = await chainHead(product.code, tx);
  await Issue.create(
    {
      productId: product.id,
      number,
      proposalId,
      madeAt,
      totals,
      uncertainty,
      contentHash,
      chainSequence: head.sequence,
      chainHash: head.hash,
    },
    { transaction: tx },
  );
  const lineIds = await lineIdsOf(product.id, issue.changedLines, madeAt, tx);
  await writeRevisions(revisions, number, issue, lineIds, tx);
  await writeResults(rows, number, product.id, lineIds, tx);
  await keepSheets(product.id, { issue: number, state: issue.state, results, uncertainty: uncertain }, tx);
  return { number, madeAt, contentHash };
}

type StoredRow = IssueContent["results"][number];
type StoredRevision = IssueContent["revisions"][number] & { retired: boolean; body: string };

function storedRevision({ kind, number, letter, retired, body }: LineState, productCode: string): StoredRevision {
  const text = canonicalJson(body);
  const hash = lineRevisionHash({ productCode, kind, number, letter, retired, body: text });
  return { kind, number, letter, retired, body: text, hash };
}

/** Results that the newest issue does not hold already, as rows. What was reused as it is needs no comparing. */
function changedResults(before: BudgetResults | null, after: BudgetResults): StoredRow[] {
  const known = new Map(resultsOf(before).map((result) => [pairOf(result), result]));
  return resultsOf(after).flatMap((result) => {
    const frozen = known.get(pairOf(result));
    if (frozen === result) return [];
    const row = storedRow(result);
    return frozen && canonicalJson(storedRow(frozen)) === canonicalJson(row) ? [] : [row];
  });
}

function resultsOf(results: BudgetResults | null): ItemResult[] {
  return results?.points.flatMap(({ items }) => items) ?? [];
}

function pairOf({ item, operatingPoint }: ItemResult): string {
  return `${operatingPoint} ${item}`;
}

function storedRow(result: ItemResult): StoredRow {
  const { item, operatingPoint, methodVersion, basic, growthFraction, growth, predicted } = result;
  const { answer, notes } = textsToStore(result);
  const texts = { answer: canonicalJson(answer), notes: canonicalJson(notes) };
  return { item, operatingPoint, methodVersion, basic, growthFraction, growth, predicted, ...texts };
}

async function newestOf(productId: number, tx: Transaction): Promise<{ number: number; madeAt: string }> {
  const newest = await Issue.findOne({ where: { productId }, order: [["number", "DESC"]], transaction: tx });
  return newest ? { number: newest.number, madeAt: newest.madeAt } : { number: 0, madeAt: "" };
}

function later(at: string, before: string): string {
  return at > before ? at : new Date(Date.parse(before) + 1).toISOString();
}

/** Ids by kind and number of all lines of the product; lines that are new to it get their row. */
async function lineIdsOf(productId: number, changed: readonly LineState[], at: string, tx: Transaction) {
  const known = await readLineIds(productId, tx);
  const missing = changed.filter(({ kind, number }) => !known.has(`${kind} ${number}`));
  if (missing.length === 0) return known;
  const rows = missing.map(({ kind, number }) => ({ productId, kind, number, reservedAt: at }));
  await Line.bulkCreate(rows, { transaction: tx });
  return readLineIds(productId, tx);
}

async function readLineIds(productId: number, tx: Transaction): Promise<Map<string, number>> {
  const rows = await database.query<{ id: number; key: string }>(
    "SELECT id, kind || ' ' || number AS key FROM lines WHERE product_id = :productId",
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
  return new Map(rows.map(({ id, key }) => [key, id]));
}

function idOf(ids: ReadonlyMap<string, number>, key: string): number {
  const id = ids.get(key);
  if (id === undefined) throw new Error(`There is no line ${key}.`);
  return id;
}

async function writeRevisions(
  revisions: readonly StoredRevision[],
  issue: number,
  { product, proposalId }: IssueToWrite,
  ids: ReadonlyMap<string, number>,
  tx: Transaction,
): Promise<void> {
  const rows = revisions.map(({ kind, number, letter, retired, body, hash }) => ({
    productId: product.id,
    lineId: idOf(ids, `${kind} ${number}`),
    letter,
    issue,
    retired,
    body,
    hash,
    proposalId,
  }));
  await LineRevision.bulkCreate(rows, { transaction: tx });
}

async function writeResults(
  rows: readonly StoredRow[],
  issue: number,
  productId: number,
  ids: ReadonlyMap<string, number>,
  tx: Transaction,
): Promise<void> {
  const values = rows.map(({ item, operatingPoint, ...row }) => ({
    ...row,
    productId,
    issue,
    itemId: idOf(ids, `item ${item}`),
    operatingPointId: idOf(ids, `operating_point ${operatingPoint}`),
  }));
  await Result.bulkCreate(values, { transaction: tx });
}

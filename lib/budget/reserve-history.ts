import { QueryTypes, type Transaction } from "sequelize";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import type { Actor } from "@/lib/vocabulary/actor";
import { database, inSnapshot } from "@/models/database";
import { issueFactsOf } from "./issue-facts";
import { type LineRow, type ProductRow, toLineState } from "./load-budget";
import { readableProduct } from "./queries";
import { parseTotals, type StoredPoint } from "./stored-results";
import type { IssueFacts } from "./views";

/** One issue that moved the reserve at an operating point, in hundredths of a newton. */
export interface ReserveMove {
  issue: IssueFacts;
  /** Why, as the approved round says it; null for the establishing act. */
  reason: string | null;
  /** null where the operating point was new. */
  before: number | null;
  /** Less than 0 for a draw; at the first the whole reserve. */
  change: number;
  balance: number;
  /** The terms of that issue name the operating point; elsewhere the reserve scales with the limit. */
  isStated: boolean;
  limitBefore: number | null;
  limit: number;
}

export interface ReserveHistory {
  operatingPoint: string;
  name: string;
  /** Where limit, reserve and allocations have to add up. */
  isReference: boolean;
  balance: number;
  /** Oldest first; each begins where the one before ended, and the last one ends at the balance. */
  moves: ReserveMove[];
}

/** The reserve at every operating point in force at an issue, and how it came to its balance; the reference first. */
export function reserveHistory(actor: Actor, productCode: string, issue: number): Promise<ReserveHistory[]> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const steps = await stepsTo(product, issue, tx);
    const newest = steps.at(-1);
    if (!newest) return [];
    return newest.points
      .map(({ operatingPoint, name, reserveHundredths }) => ({
        operatingPoint,
        name,
        isReference: operatingPoint === newest.reference,
        balance: reserveHundredths,
        moves: movesAt(operatingPoint, steps),
      }))
      .sort((one, other) => Number(other.isReference) - Number(one.isReference));
  });
}

/** What one issue says of the reserve. */
interface ReserveStep {
  issue: IssueFacts;
  reason: string | null;
  points: StoredPoint[];
  reference: string;
  stated: readonly string[];
}

async function stepsTo(product: ProductRow, last: number, tx: Transaction): Promise<ReserveStep[]> {
  const rows = await issueRows(product.id, last, tx);
  const facts = await issueFactsOf(product, tx);
  const terms = await termsRevisions(product.id, tx);
  return rows.map(({ number, totals, reason }) => {
    const issue = facts.find((each) => each.number === number);
    const inForce = terms.findLast((line) => line.issue <= number);
    if (!issue || inForce?.kind !== "terms") throw new Error(`Issue ${number} of ${product.code} is not whole.`);
    const { reserves, referenceOperatingPoint: reference } = inForce.body;
    const stated = reserves.map(({ operatingPoint }) => operatingPoint);
    return { issue, reason, points: parseTotals(totals).points, reference, stated };
  });
}

interface StepRow {
  number: number;
  totals: string;
  reason: string | null;
}

function issueRows(productId: number, last: number, tx: Transaction): Promise<StepRow[]> {
  return database.query<StepRow>(
    `SELECT i.number, i.totals, r.reason
     FROM issues i
       LEFT JOIN proposals p ON p.id = i.proposal_id
       LEFT JOIN rounds r ON r.proposal_id = p.id AND r.number = p.round
     WHERE i.product_id = :productId AND i.number <= :last ORDER BY i.number`,
    { type: QueryTypes.SELECT, replacements: { productId, last }, transaction: tx },
  );
}

async function termsRevisions(productId: number, tx: Transaction): Promise<LineState[]> {
  const rows = await database.query<LineRow>(
    `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body
     FROM lines l JOIN line_revisions r ON r.line_id = l.id
     WHERE l.product_id = :productId AND l.kind = 'terms' ORDER BY r.issue`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
  return rows.map(toLineState);
}

function movesAt(operatingPoint: string, steps: readonly ReserveStep[]): ReserveMove[] {
  const moves: ReserveMove[] = [];
  let held: StoredPoint | null = null;
  for (const { issue, reason, points, stated } of steps) {
    const point = points.find((each) => each.operatingPoint === operatingPoint);
    // Retired for a while: it comes back with what it left with, or the move says otherwise.
    if (!point) continue;
    const { reserveHundredths: balance, limitHundredths: limit } = point;
    const before: number | null = held?.reserveHundredths ?? null;
    if (balance !== before) {
      const limits = { limitBefore: held?.limitHundredths ?? null, limit };
      const isStated = stated.includes(operatingPoint);
      moves.push({ issue, reason, before, change: balance - (before ?? 0), balance, isStated, ...limits });
    }
    held = point;
  }
  return moves;
}

import { QueryTypes, type Transaction } from "sequelize";
import type { MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database, inSnapshot } from "@/models/database";
import { readableProduct } from "../queries";
import { parseKeptResult } from "./kept-result";

/** A run as it was kept. */
export interface RunView {
  id: number;
  issue: number;
  operatingPoint: string;
  seed: number;
  draws: number;
  recipe: string;
  inputHash: string;
  resultHash: string;
  by: string;
  at: string;
  result: MonteCarloResult;
}

/** The runs of an issue at one operating point, oldest first. */
export function runsOf(actor: Actor, productCode: string, issue: number, operatingPoint: string): Promise<RunView[]> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const rows = await runRows(product.id, "r.issue = :issue AND l.number = :operatingPoint", tx, {
      issue,
      operatingPoint,
    });
    return rows.map(toView);
  });
}

/** One run with the bytes that came out of it. */
export function keptRun(actor: Actor, productCode: string, runId: number): Promise<RunView & { text: string }> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const [row] = await runRows(product.id, "r.id = :runId", tx, { runId });
    if (!row) throw new Refusal("not_found", "There is no such run of this budget.");
    return { ...toView(row), text: row.text };
  });
}

interface RunRow extends Omit<RunView, "result"> {
  text: string;
}

function runRows(
  productId: number,
  condition: string,
  tx: Transaction,
  values: Record<string, string | number>,
): Promise<RunRow[]> {
  return database.query<RunRow>(
    `SELECT r.id, r.issue, l.number AS operatingPoint, r.seed, r.draws, r.recipe, r.input_hash AS inputHash,
       r.result_hash AS resultHash, r.printed_name AS by, r.ran_at AS at, r.result AS text
     FROM monte_carlo_runs r JOIN lines l ON l.id = r.operating_point_id
     WHERE r.product_id = :productId AND ${condition} ORDER BY r.id`,
    { type: QueryTypes.SELECT, replacements: { productId, ...values }, transaction: tx },
  );
}

function toView({ text, ...row }: RunRow): RunView {
  return { ...row, result: parseKeptResult(text) };
}

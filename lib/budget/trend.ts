import { QueryTypes, type Transaction } from "sequelize";
import { database } from "@/models/database";
import type { ProductRow } from "./load-budget";
import { type BasisAt, measureBasesOf } from "./measure-bases";
import { parseTotals, type StoredPoint } from "./stored-results";
import type { TrendPoint } from "./views";

/** Totals at every operating point by the number of the issue, oldest first; of the newest `most` issues. */
export async function trendPoints(
  product: Pick<ProductRow, "id" | "kind">,
  tx: Transaction,
  most = Number.MAX_SAFE_INTEGER,
): Promise<Map<number, TrendPoint[]>> {
  const rows = await database.query<{ number: number; totals: string }>(
    "SELECT number, totals FROM issues WHERE product_id = :productId ORDER BY number DESC LIMIT :most",
    { type: QueryTypes.SELECT, replacements: { productId: product.id, most }, transaction: tx },
  );
  const basisAt = await measureBasesOf(product, tx);
  return new Map(
    rows
      .reverse()
      .map(({ number, totals }) => [
        number,
        parseTotals(totals).points.map((point) => trendPoint(number, point, basisAt)),
      ]),
  );
}

function trendPoint(issue: number, point: StoredPoint, basisAt: BasisAt): TrendPoint {
  const { operatingPoint, name, totals, limitHundredths, reserveHundredths, standing } = point;
  const { basic, growth, predicted, margin } = totals;
  const limits = { limit: limitHundredths / 100, reserve: reserveHundredths / 100 };
  return { operatingPoint, name, basic, growth, predicted, ...limits, margin, standing, basis: basisAt(issue, point) };
}

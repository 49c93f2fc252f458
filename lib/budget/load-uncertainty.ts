import { QueryTypes, type Transaction } from "sequelize";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database } from "@/models/database";
import { parseUncertainty, type StoredUncertainty } from "./stored-uncertainty";

/** How uncertain an issue's totals are, as it froze it; null where it keeps nothing of it. */
export async function loadUncertainty(
  productId: number,
  issue: number,
  tx: Transaction,
): Promise<StoredUncertainty | null> {
  const [row] = await database.query<{ uncertainty: string | null }>(
    "SELECT uncertainty FROM issues WHERE product_id = :productId AND number = :issue",
    { type: QueryTypes.SELECT, replacements: { productId, issue }, transaction: tx },
  );
  if (!row) throw new Refusal("not_found", `There is no issue ${issue} of this budget.`);
  return row.uncertainty === null ? null : parseUncertainty(row.uncertainty);
}

import { QueryTypes } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database, inSnapshot } from "@/models/database";
import { issueNumber, readableProduct, type AsOf } from "./queries";
import { parseUncertainty, type StoredUncertainty } from "./stored-uncertainty";

/** How uncertain a budget is as it stands or stood, as its issue froze it; null where the issue keeps nothing of it. */
export function uncertaintyAt(actor: Actor, productCode: string, asOf: AsOf): Promise<StoredUncertainty | null> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const number = await issueNumber(product, asOf, tx);
    const [row] = await database.query<{ uncertainty: string | null }>(
      "SELECT uncertainty FROM issues WHERE product_id = :productId AND number = :number",
      { type: QueryTypes.SELECT, replacements: { productId: product.id, number }, transaction: tx },
    );
    if (!row) throw new Refusal("not_found", `There is no issue ${number} of this budget.`);
    return row.uncertainty === null ? null : parseUncertainty(row.uncertainty);
  });
}

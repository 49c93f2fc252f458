import type { Actor } from "@/lib/vocabulary/actor";
import { inSnapshot } from "@/models/database";
import { loadUncertainty } from "./load-uncertainty";
import { issueNumber, readableProduct, type AsOf } from "./queries";
import type { StoredUncertainty } from "./stored-uncertainty";

/** How uncertain a budget is as it stands or stood, as its issue froze it; null where the issue keeps nothing of it. */
export function uncertaintyAt(actor: Actor, productCode: string, asOf: AsOf): Promise<StoredUncertainty | null> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    return loadUncertainty(product.id, await issueNumber(product, asOf, tx), tx);
  });
}

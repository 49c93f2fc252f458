import { requireActor } from "@/app/_server/session";
import { type SheetAt, sheetAt } from "@/lib/budget/sheet-at";

import { asOf, pageProduct, readForPage } from "./read-page";

/** The kept sheet that a page's address asks for; null while the product is not established. */
export async function pageSheet(
  productCode: string,
  query: { issue?: number; on?: string; point?: string },
): Promise<SheetAt | null> {
  const product = await pageProduct(productCode);
  if (product.newestIssue === null) return null;
  const actor = await requireActor();
  return readForPage(() => sheetAt(actor, productCode, asOf(query), query.point));
}

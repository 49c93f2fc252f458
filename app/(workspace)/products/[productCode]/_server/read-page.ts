import { forbidden, notFound } from "next/navigation";
import { cache } from "react";

import { requireActor } from "@/app/_server/session";
import { type AsOf, budgetAt, productFactsFor } from "@/lib/budget/queries";
import type { BudgetAt, ProductFacts } from "@/lib/budget/views";
import { Refusal } from "@/lib/vocabulary/refusal";

/** The product of a page, once per request; who may not see it is told so, what is not there is not found. */
export const pageProduct = cache(async (productCode: string): Promise<ProductFacts> => {
  const actor = await requireActor();
  return readForPage(() => productFactsFor(actor, productCode));
});

/** The budget that a page's address asks for; null while the product is not established. */
export async function pageBudget(
  productCode: string,
  query: { issue?: number; on?: string },
): Promise<BudgetAt | null> {
  const product = await pageProduct(productCode);
  if (product.newestIssue === null) return null;
  const actor = await requireActor();
  return readForPage(() => budgetAt(actor, productCode, asOf(query)));
}

/** An issue by its number, else the one that stood when a day ended, else the newest. */
export function asOf({ issue, on }: { issue?: number; on?: string }): AsOf {
  if (issue !== undefined) return issue;
  return on === undefined ? "newest" : { day: on };
}

/** Turns a "no" of a read into the page that says so; anything else is a bug and goes on its way. */
export async function readForPage<Value>(read: () => Promise<Value>): Promise<Value> {
  try {
    return await read();
  } catch (error) {
    if (error instanceof Refusal && error.code === "not_found") notFound();
    if (error instanceof Refusal && error.code === "forbidden") forbidden();
    throw error;
  }
}

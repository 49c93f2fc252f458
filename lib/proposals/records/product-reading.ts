import type { Transaction } from "sequelize";
import { productByCode, type ProductRow } from "@/lib/budget/load-budget";
import { namesOf } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { authorize } from "@/policies/authorize";

/** Reads that agree with each other, for somebody who may see the product; null where there is no such product. */
export function reading<T>(
  actor: Actor,
  productCode: string,
  read: (from: { product: ProductRow; tx: Transaction }) => Promise<T | null>,
): Promise<T | null> {
  return inSnapshot(async (tx) => {
    const product = await productByCode(productCode, tx).catch((problem: unknown) => {
      if (problem instanceof Refusal && problem.code === "not_found") return null;
      throw problem;
    });
    if (!product) return null;
    authorize(actor, { on: "Product", action: "read_budget", productId: product.id });
    return read({ product, tx });
  });
}

/** Names by the person's id. */
export async function peopleOf(productId: number, tx: Transaction): Promise<Map<number, string>> {
  return new Map((await namesOf(productId, tx)).map(({ id, name }) => [id, name]));
}

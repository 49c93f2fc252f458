import { registerFor } from "@/lib/products/queries";
import type { Actor } from "@/lib/vocabulary/actor";
import { isAllowed } from "@/policies/authorize";

/** Products whose first issue the person may sign and that have none yet. */
export async function productsToEstablish(actor: Actor): Promise<{ code: string; name: string }[]> {
  return (await registerFor(actor))
    .map(({ product }) => product)
    .filter(({ id, newestIssue }) => newestIssue === null && mayEstablish(actor, id))
    .map(({ code, name }) => ({ code, name }));
}

function mayEstablish(actor: Actor, productId: number): boolean {
  return isAllowed(actor, { on: "Product", action: "establish", productId });
}

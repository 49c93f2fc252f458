import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inSnapshot } from "@/models/database";
import { openProposals } from "./waiting-for";

/** How many open proposals and drafts of each product wait for a person, by the product's code. */
export function waitingByProduct(actor: Actor, clock: Clock = systemClock): Promise<ReadonlyMap<string, number>> {
  return inSnapshot(async (tx) => {
    const products = await openProposals(actor, clock().toISOString(), tx);
    return new Map(
      products.map(({ product, open }) => [product.code, open.filter(({ tasks }) => tasks.length > 0).length]),
    );
  });
}

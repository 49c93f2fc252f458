import type { ChainReport } from "@/lib/audit/chain-report";
import {
  exportedChain,
  headOf,
  historyChoices,
  historyPage,
  type ExportedEntry,
  type HistoryFilter,
  type HistoryPage,
} from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import type { Actor } from "@/lib/vocabulary/actor";
import { inSnapshot } from "@/models/database";
import { authorize } from "@/policies/authorize";
import { productByCode } from "./load-budget";

export interface ProductHistory extends HistoryPage {
  /** Where the chain ends; null while it has no entry. */
  head: { sequence: number; hash: string } | null;
  persons: { id: number; name: string }[];
  acts: string[];
}

/** One page of a product's history, newest first, for those who may read it. */
export async function productHistory(
  actor: Actor,
  productCode: string,
  filter: Omit<HistoryFilter, "chain">,
  page: number,
): Promise<ProductHistory> {
  const chain = await readableChain(actor, productCode);
  const [shown, head, choices] = await Promise.all([
    historyPage({ ...filter, chain }, page),
    headOf(chain),
    historyChoices(chain),
  ]);
  return { ...shown, head, ...choices };
}

/** Proves the product's chain from what is stored; `knownHead` is one that was noted outside earlier. */
export async function checkHistory(
  actor: Actor,
  productCode: string,
  knownHead?: { sequence: number; hash: string },
): Promise<ChainReport> {
  return verifyChain(await readableChain(actor, productCode), knownHead ? { knownHead } : {});
}

/** The chain as it is stored, to be checked away from the installation. */
export async function exportedHistory(actor: Actor, productCode: string): Promise<ExportedEntry[]> {
  return exportedChain(await readableChain(actor, productCode));
}

/** A product's chain carries its code. */
function readableChain(actor: Actor, productCode: string): Promise<string> {
  return inSnapshot(async (tx) => {
    const product = await productByCode(productCode, tx);
    authorize(actor, { on: "Product", action: "read_history", productId: product.id });
    return product.code;
  });
}

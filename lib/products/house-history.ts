import type { ChainReport } from "@/lib/audit/chain-report";
import { headOf, historyChoices, historyPage, type HistoryFilter, type HistoryPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import { authorize } from "@/policies/authorize";

export interface HouseHistory extends HistoryPage {
  /** Where the chain ends; null while it has no entry. */
  head: { sequence: number; hash: string } | null;
  persons: { id: number; name: string }[];
  acts: string[];
}

/** One page of the history of the installation: accounts, products, sign-ins; newest first. */
export async function houseHistory(
  actor: Actor,
  filter: Omit<HistoryFilter, "chain">,
  page: number,
): Promise<HouseHistory> {
  authorize(actor, { on: "Installation", action: "read_house_history" });
  const [shown, head, choices] = await Promise.all([
    historyPage({ ...filter, chain: HOUSE_CHAIN }, page),
    headOf(HOUSE_CHAIN),
    historyChoices(HOUSE_CHAIN),
  ]);
  return { ...shown, head, ...choices };
}

/** Proves the chain of the installation from what is stored. */
export async function checkHouseHistory(actor: Actor): Promise<ChainReport> {
  authorize(actor, { on: "Installation", action: "read_house_history" });
  return verifyChain(HOUSE_CHAIN);
}

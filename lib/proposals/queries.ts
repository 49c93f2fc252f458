import type { Transaction } from "sequelize";
import { newestIssue, type ProductRow } from "@/lib/budget/load-budget";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { authorize, isAllowed } from "@/policies/authorize";
import { budgetReader } from "./records/budget-reader";
import { isOpen, wrongStateSentence } from "./records/moves";
import { peopleOf, reading } from "./records/product-reading";
import { listedProposals } from "./reading/proposal-list";
import { patchOf } from "./reading/proposal-patch";
import { labelOf, proposalByKey, proposalQuestion, type ProposalRecord } from "./records/proposal-record";
import { proposalViewOf } from "./reading/proposal-view";
import { roundOf } from "./records/round-record";
import { reviewRound } from "./review/round-review";
import { settlementViewOf } from "./reading/settlement-view";
import { unsubmittedRound } from "./records/unsubmitted-round";
import type { ProductView, ProposalView } from "./views";
import type { ProposalListRow, SettlementView } from "./workspace-views";

export interface ProposalListView {
  product: ProductView;
  /** null until the product is established. */
  newestIssue: number | null;
  mayStart: boolean;
  rows: ProposalListRow[];
}

/** Proposals of a product, and the drafts that the reader may see; newest first. */
export function proposalList(
  actor: Actor,
  productCode: string,
  clock: Clock = systemClock,
): Promise<ProposalListView | null> {
  return reading(actor, productCode, async ({ product, tx }) => {
    const at = clock().toISOString();
    const newest = await newestIssue(product.id, tx);
    const budgets = budgetReader(product.id, tx);
    const people = await peopleOf(product.id, tx);
    const listed = newest === null ? [] : await listedProposals(actor, product.id, people, { at, budgets, tx });
    const { id, code, name, kind } = product;
    return {
      product: { id, code, name, kind },
      newestIssue: newest,
      mayStart: newest !== null && isAllowed(actor, { on: "Product", action: "start_draft", productId: id }),
      rows: listed.map(({ row }) => row),
    };
  });
}

/** One proposal: its current round, an earlier one, or the draft; null where there is none. */
export function proposalView(
  actor: Actor,
  productCode: string,
  key: string,
  round?: number,
  clock: Clock = systemClock,
): Promise<ProposalView | null> {
  return reading(actor, productCode, async ({ product, tx }) => {
    const proposal = await readableProposal(actor, product, key, tx);
    if (!proposal) return null;
    const at = clock().toISOString();
    return proposalViewOf(actor, proposal, round, { at, budgets: budgetReader(product.id, tx), tx });
  });
}

/** The change as a unified patch, to be kept or compared outside. */
export function proposalPatch(
  actor: Actor,
  productCode: string,
  key: string,
  round?: number,
  clock: Clock = systemClock,
): Promise<{ label: string; text: string } | null> {
  return reading(actor, productCode, async ({ product, tx }) => {
    const proposal = await readableProposal(actor, product, key, tx);
    if (!proposal) return null;
    const at = clock().toISOString();
    const budgets = budgetReader(product.id, tx);
    const submitted = await roundOf(proposal.id, round ?? proposal.round, tx);
    if (!submitted && (round !== undefined || proposal.round > 0)) return null;
    const shown = submitted ?? (await unsubmittedRound(proposal, budgets, at, tx));
    const review = await reviewRound(proposal, shown, budgets, { at, tx, onIssue: shown.baseIssue });
    return { label: labelOf(proposal), text: patchOf(review) };
  });
}

/** What carrying forward would settle. @throws Refusal where there is nothing to carry, or not for this reader */
export async function settlementView(actor: Actor, productCode: string, key: string): Promise<SettlementView> {
  const view = await reading(actor, productCode, async ({ product, tx }) => {
    const proposal = await proposalByKey(product.id, key, tx);
    if (!proposal) return null;
    authorize(actor, proposalQuestion(proposal, actor, "edit"));
    if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    if ((await newestIssue(product.id, tx)) === proposal.baseIssue) {
      throw new Refusal("wrong_state", "It stands on the newest issue already: there is nothing to carry forward.");
    }
    const people = await peopleOf(product.id, tx);
    return settlementViewOf(proposal, people, { budgets: budgetReader(product.id, tx), tx });
  });
  if (!view) throw new Refusal("not_found", "There is no such proposal.");
  return view;
}

async function readableProposal(
  actor: Actor,
  product: ProductRow,
  key: string,
  tx: Transaction,
): Promise<ProposalRecord | null> {
  const proposal = await proposalByKey(product.id, key, tx);
  if (proposal) authorize(actor, proposalQuestion(proposal, actor, "read"));
  return proposal;
}

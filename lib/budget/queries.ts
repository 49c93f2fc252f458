import type { Transaction } from "sequelize";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { authorize } from "@/policies/authorize";
import { endOfDay } from "./calendar";
import { issueFactsOf } from "./issue-facts";
import { loadBudget, newestIssue, productByCode, type ProductRow } from "./load-budget";
import { loadUncertainty } from "./load-uncertainty";
import { namesOf } from "./members";
import { trendPoints } from "./trend";
import type { BudgetAt, IssueFacts, ProductFacts, TrendIssue } from "./views";

/** An issue by its number, the newest, the one that stood at a moment, or the one that stood when a day ended. */
export type AsOf = number | "newest" | { at: string } | { day: string };

/** A budget as it stands or stood; every part of it from one moment of the database. */
export function budgetAt(actor: Actor, productCode: string, asOf: AsOf): Promise<BudgetAt> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const number = await issueNumber(product, asOf, tx);
    const { state, results } = await loadBudget(product.id, number, tx);
    const facts = await issueFactsOf(product, tx);
    const issue = facts.find((each) => each.number === number);
    if (!issue) throw new Refusal("not_found", `There is no issue ${number} of this budget.`);
    const people = await namesOf(product.id, tx);
    const uncertainty = await loadUncertainty(product.id, number, tx);
    const allocations = allocationsView(state, results);
    return { product: productFacts(product, facts), issue, state, results, uncertainty, allocations, people };
  });
}

/** What a member may know of a product before anything of its budget is read. */
export function productFactsFor(actor: Actor, productCode: string): Promise<ProductFacts> {
  return inSnapshot(async (tx) => {
    const product = await productByCode(productCode, tx);
    authorize(actor, { on: "Product", action: "see", productId: product.id });
    return { ...product, newestIssue: await newestIssue(product.id, tx) };
  });
}

/** Every issue, oldest first. */
export function issuesOf(actor: Actor, productCode: string): Promise<IssueFacts[]> {
  return inSnapshot(async (tx) => issueFactsOf(await readableProduct(actor, productCode, tx), tx));
}

/** Predicted, limit, reserve and margin at every operating point over all issues, oldest first. */
export function trendOf(actor: Actor, productCode: string): Promise<TrendIssue[]> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const byNumber = await trendPoints(product, tx);
    const facts = await issueFactsOf(product, tx);
    return facts.map(({ number, at, proposal }) => ({ number, at, proposal, points: byNumber.get(number) ?? [] }));
  });
}

/** The product of a code, for somebody who may read its budget. */
export async function readableProduct(actor: Actor, productCode: string, tx: Transaction): Promise<ProductRow> {
  const product = await productByCode(productCode, tx);
  authorize(actor, { on: "Product", action: "read_budget", productId: product.id });
  return product;
}

export async function issueNumber(product: ProductRow, asOf: AsOf, tx: Transaction): Promise<number> {
  if (typeof asOf === "number") return asOf;
  const number = await newestIssue(product.id, tx, momentOf(product, asOf));
  if (number !== null) return number;
  const sentence = asOf === "newest" ? "This product has not been established yet." : "It was not established by then.";
  throw new Refusal("not_found", sentence);
}

function momentOf({ timeZone }: ProductRow, asOf: Exclude<AsOf, number>): string | undefined {
  if (asOf === "newest") return undefined;
  return "at" in asOf ? asOf.at : endOfDay(timeZone, asOf.day);
}

function productFacts(product: ProductRow, issues: readonly IssueFacts[]): ProductFacts {
  return { ...product, newestIssue: issues.at(-1)?.number ?? null };
}

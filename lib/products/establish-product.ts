import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import { newestIssue, productByCode } from "@/lib/budget/load-budget";
import { membersAt } from "@/lib/budget/members";
import { writeIssue } from "@/lib/budget/write-issue";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { passwordRefusal } from "@/lib/users/password-refusal";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { authorize } from "@/policies/authorize";
import { ESTABLISHMENT_MEANING, establishmentText } from "./establishment-text";
import { firstIssueLines } from "./first-issue";
import type { EstablishProductInput } from "./schema";
import { signManagerText } from "./sign-manager-text";

export interface EstablishedProduct {
  issue: number;
  contentHash: string;
  /** What is wise to put right soon; nothing that keeps it from standing. */
  warnings: string[];
}

/** The one act without a second person: a program manager signs issue 1. */
export async function establishProduct(
  actor: Actor,
  input: EstablishProductInput,
  clock: Clock,
): Promise<EstablishedProduct> {
  const frame = { act: "establish_product", chain: input.productCode } as const;
  const wrongPassword = await passwordRefusal(actor.userId, input.password);
  return performAct(actor, clock, frame, async (tx, record, at) => {
    const product = await productByCode(input.productCode, tx);
    authorize(actor, { on: "Product", action: "establish", productId: product.id });
    if ((await newestIssue(product.id, tx)) !== null) {
      throw new Refusal("wrong_state", `${product.code} is established already: everything else comes by proposals.`);
    }
    if (wrongPassword) throw wrongPassword;

    const lines = firstIssueLines(product.kind, input);
    const { code, name, kind } = product;
    const state: BudgetState = { product: { code, name, kind }, lines };
    const results = evaluateBudget(state);
    const issue = { product, proposalId: null, at, changedLines: lines, state, resultsBefore: null, results };
    const { number, contentHash } = await writeIssue(issue, tx);
    const canonicalText = establishmentText({ state, contentHash, signer: actor, at });
    const signed = { subjectType: "establishment", baselineId: null, meaning: ESTABLISHMENT_MEANING } as const;
    const signature = await signManagerText(actor, { productId: product.id, ...signed, canonicalText, at }, tx);
    record({
      act: "establish_product",
      subject: { type: "issue", id: String(number), label: `${code} issue ${number}` },
      capacity: "program_manager",
      now: { issue: number, contentHash, signature },
    });
    return { issue: number, contentHash, warnings: await warningsFor(product.id, at, tx) };
  });
}

/** A budget that one program manager holds alone can't be changed where their own change needs another. */
export async function warningsFor(productId: number, at: string, tx: Transaction): Promise<string[]> {
  const members = await membersAt(productId, at, tx);
  const holding = (role: string) => members.filter(({ roles }) => roles.some((each) => each === role)).length;
  return [
    ...(holding("program_manager") < 2
      ? ["This product has one program manager: nobody else could sign what they propose themselves."]
      : []),
    ...(holding("reviewer") < 1 ? ["This product has no reviewer yet: no proposal can be approved."] : []),
  ];
}

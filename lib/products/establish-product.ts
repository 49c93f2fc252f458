import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import { textHash } from "@/lib/audit/text-hash";
import { newestIssue, productByCode, type ProductRow } from "@/lib/budget/load-budget";
import { membersAt } from "@/lib/budget/members";
import { writeIssue } from "@/lib/budget/write-issue";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { demandPassword } from "@/lib/users/demand-password";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Signature } from "@/models/signature";
import { authorize } from "@/policies/authorize";
import { ESTABLISHMENT_MEANING, establishmentText } from "./establishment-text";
import { firstIssueLines } from "./first-issue";
import type { EstablishProductInput } from "./schema";

export interface EstablishedProduct {
  issue: number;
  contentHash: string;
  /** What is wise to put right soon; nothing that keeps it from standing. */
  warnings: string[];
}

/** The one act without a second person: a program manager signs issue 1. */
export async function establishProduct(
  actor: Actor,
  clock: Clock,
  input: EstablishProductInput,
): Promise<EstablishedProduct> {
  const frame = { act: "establish_product", chain: input.productCode } as const;
  // Hashing a password is slow: it is done before the transaction.
  const password = await passwordOutcome(actor, input.password);
  return performAct(actor, clock, frame, async (tx, record, at) => {
    const product = await productByCode(input.productCode, tx);
    authorize(actor, { on: "Product", action: "establish", productId: product.id });
    if ((await newestIssue(product.id, tx)) !== null) {
      throw new Refusal("wrong_state", `${product.code} is established already: everything else comes by proposals.`);
    }
    if (password !== null) throw password;

    const lines = firstIssueLines(product.kind, input);
    const { code, name, kind } = product;
    const state: BudgetState = { product: { code, name, kind }, lines };
    const results = evaluateBudget(state);
    const issue = { product, proposalId: null, at, changedLines: lines, resultsBefore: null, results };
    const { number, contentHash } = await writeIssue(issue, tx);
    const signature = await sign(actor, product, state, contentHash, at, tx);
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

/** Refused only after the right and the state were checked, so that the sentence fits what is wrong first. */
async function passwordOutcome(actor: Actor, password: string): Promise<Refusal | null> {
  try {
    await demandPassword(actor.userId, password);
    return null;
  } catch (problem) {
    if (problem instanceof Refusal) return problem;
    throw problem;
  }
}

async function sign(
  actor: Actor,
  { id }: ProductRow,
  state: BudgetState,
  contentHash: string,
  at: string,
  tx: Transaction,
): Promise<string> {
  const canonicalText = establishmentText({ state, contentHash, signer: actor, at });
  const hash = textHash("signature", canonicalText);
  const last: number | null = await Signature.max("sequence", { where: { productId: id }, transaction: tx });
  await Signature.create(
    {
      productId: id,
      sequence: (last ?? 0) + 1,
      subjectType: "establishment",
      signerId: actor.userId,
      printedName: actor.printedName,
      capacity: "program_manager",
      decision: "approve",
      meaning: ESTABLISHMENT_MEANING,
      canonicalText,
      hash,
      signedAt: at,
    },
    { transaction: tx },
  );
  return hash;
}

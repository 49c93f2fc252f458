import { performAct } from "@/lib/audit/perform-act";
import { productByCode } from "@/lib/budget/load-budget";
import { passwordRefusal } from "@/lib/users/password-refusal";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Baseline } from "@/models/baseline";
import { Issue } from "@/models/issue";
import { authorize } from "@/policies/authorize";
import type { MakeBaselineInput } from "./schema";
import { signManagerText } from "./sign-manager-text";

const MEANING = "Issue released as a baseline";

/** Gives an issue a name, a purpose and a program manager's signature. It makes no issue of its own. */
export async function makeBaseline(
  actor: Actor,
  { productCode, issue: number, name, purpose, password }: MakeBaselineInput,
  clock: Clock,
): Promise<{ baselineId: number }> {
  const wrongPassword = await passwordRefusal(actor.userId, password);
  return performAct(actor, clock, { act: "make_baseline", chain: productCode }, async (tx, record, at) => {
    const product = await productByCode(productCode, tx);
    authorize(actor, { on: "Product", action: "make_baseline", productId: product.id });
    const issue = await Issue.findOne({ where: { productId: product.id, number }, transaction: tx });
    if (!issue) throw new Refusal("not_found", `There is no issue ${number} of this budget.`);
    if ((await Baseline.count({ where: { productId: product.id, name }, transaction: tx })) > 0) {
      const sentence = "There is a baseline of this name already.";
      throw new Refusal("duplicate", sentence, [{ path: "name", sentence }]);
    }
    if (wrongPassword) throw wrongPassword;

    const baseline = await Baseline.create(
      { productId: product.id, issue: number, name, purpose, signerId: actor.userId, madeAt: at },
      { transaction: tx },
    );
    const canonicalText = [
      "leeboard-baseline/1",
      `product: ${product.code} ${product.name}`,
      `issue: ${number}`,
      `content: ${issue.contentHash}`,
      `name: ${name}`,
      `purpose: ${purpose}`,
      "capacity: program_manager",
      `meaning: ${MEANING}`,
      `signer: ${actor.printedName} (${actor.userId})`,
      `signed: ${at}`,
    ].join("\n");
    const subject = { subjectType: "baseline", baselineId: baseline.id } as const;
    const signature = await signManagerText(
      actor,
      { productId: product.id, ...subject, meaning: MEANING, canonicalText, at },
      tx,
    );
    record({
      act: "make_baseline",
      subject: { type: "issue", id: String(number), label: `${productCode} issue ${number}` },
      capacity: "program_manager",
      now: { name, purpose, contentHash: issue.contentHash, signature },
    });
    return { baselineId: baseline.id };
  });
}

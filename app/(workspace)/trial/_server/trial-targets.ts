import { asRecord } from "@/app/_components/line-fields/body";
import { budgetAt } from "@/lib/budget/queries";
import type { BudgetAt } from "@/lib/budget/views";
import { adoptedVersion } from "@/lib/evaluation/budget/adopted-versions";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";
import type { Actor } from "@/lib/vocabulary/actor";
import { authorize, isAllowed } from "@/policies/authorize";

import type { TrialTargets } from "../_trial/proposal-edit";

/** What a person may make of a trial in a product. */
export async function trialTargets(actor: Actor, productCode: string): Promise<TrialTargets> {
  const { product, state } = await budgetAt(actor, productCode, "newest");
  authorize(actor, { on: "Product", action: "start_draft", productId: product.id });
  return {
    userId: actor.userId,
    items: revisable(actor, product.id, state.lines),
    taken: state.lines.filter(({ kind }) => kind === "item").map(({ number }) => number),
    nextOrder: (state.lines.filter(({ kind }) => kind === "item").length + 1) * 10,
    versions: Object.fromEntries(METHOD_NAMES.map((method) => [method, adoptedVersion(state, method)])),
    finishes: state.lines.flatMap((line) =>
      line.kind === "finish" && !line.retired ? [{ number: line.number, roughness: line.body.roughness.value }] : [],
    ),
  };
}

function revisable(actor: Actor, productId: number, lines: BudgetAt["state"]["lines"]): TrialTargets["items"] {
  return lines.flatMap((line) => {
    if (line.kind !== "item" || line.retired) return [];
    const { ownerId, name } = line.body;
    const mayRevise = isAllowed(actor, {
      on: "Line",
      action: "revise",
      productId,
      kind: "item",
      ownerBefore: ownerId,
      ownerAfter: ownerId,
    });
    return mayRevise ? [{ number: line.number, name, letter: line.letter, body: asRecord(line.body) }] : [];
  });
}

import { performAct } from "@/lib/audit/perform-act";
import { dayIn } from "@/lib/budget/calendar";
import { productByCode } from "@/lib/budget/load-budget";
import { membersAt } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Deputy } from "@/models/deputy";
import { authorize } from "@/policies/authorize";
import type { NameDeputyInput } from "./schema";

/** Names who signs for the actor on a range of days of the product's calendar. The office is not passed on. */
export function nameDeputy(
  actor: Actor,
  { productCode, deputyId, fromDay, untilDay }: NameDeputyInput,
  clock: Clock,
): Promise<{ deputyshipId: number }> {
  return performAct(actor, clock, { act: "name_deputy", chain: productCode }, async (tx, record, at) => {
    const product = await productByCode(productCode, tx);
    authorize(actor, { on: "Product", action: "name_deputy", productId: product.id });
    if (untilDay < dayIn(product.timeZone, new Date(at))) throw atField("untilDay", "This day has passed.");
    const member = (await membersAt(product.id, at, tx)).find(({ userId }) => userId === deputyId);
    if (deputyId === actor.userId) throw atField("deputyId", "Name another person.");
    if (!member?.roles.some((role) => role !== "auditor")) {
      throw atField("deputyId", "A deputy holds a role in this product, other than auditor.");
    }
    const deputy = await Deputy.create(
      {
        productId: product.id,
        holderId: actor.userId,
        deputyId,
        fromDay,
        untilDay,
        namedById: actor.userId,
        namedAt: at,
      },
      { transaction: tx },
    );
    record({
      act: "name_deputy",
      subject: { type: "person", id: String(deputyId), label: member.printedName },
      now: { deputyFor: actor.printedName, from: fromDay, until: untilDay },
    });
    return { deputyshipId: deputy.id };
  });
}

function atField(path: string, sentence: string): Refusal {
  return new Refusal("invalid", sentence, [{ path, sentence }]);
}

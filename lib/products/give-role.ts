import { performAct } from "@/lib/audit/perform-act";
import { productByCode } from "@/lib/budget/load-budget";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { Membership } from "@/models/membership";
import { User } from "@/models/user";
import { authorize } from "@/policies/authorize";
import type { GiveRoleInput } from "./schema";

/** Gives a person a role in a product from now on. It stands in the product's history, where its auditors read it. */
export function giveRole(
  actor: Actor,
  { productCode, userId, role, reason }: GiveRoleInput,
  clock: Clock,
): Promise<{ membershipId: number }> {
  return performAct(actor, clock, { act: "give_role", chain: productCode }, async (tx, record, at) => {
    authorize(actor, { on: "Installation", action: "give_role" });
    const product = await productByCode(productCode, tx);
    const user = await User.findByPk(userId, { attributes: ["id", "name", "active"], transaction: tx });
    if (!user?.active) throw atUser("not_found", "There is no open account of this person.");
    const held = { userId, productId: product.id, role, untilAt: null };
    if ((await Membership.count({ where: held, transaction: tx })) > 0) {
      throw atUser("duplicate", `${user.name} is ${ROLE_NAMES[role].toLowerCase()} of ${productCode} already.`);
    }
    const membership = await Membership.create({ ...held, fromAt: at }, { transaction: tx });
    record({
      act: "give_role",
      subject: { type: "person", id: String(userId), label: user.name },
      now: { role, from: at },
      ...(reason === "" ? {} : { reason }),
    });
    return { membershipId: membership.id };
  });
}

function atUser(code: "not_found" | "duplicate", sentence: string): Refusal {
  return new Refusal(code, sentence, [{ path: "userId", sentence }]);
}

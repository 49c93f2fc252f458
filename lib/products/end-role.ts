import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import { productById } from "@/lib/budget/load-budget";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { Membership } from "@/models/membership";
import { User } from "@/models/user";
import { authorize } from "@/policies/authorize";
import type { EndRoleInput } from "./schema";

/** Ends a role now. The row stays, with its dates; items that the person owns keep their owner until handed over. */
export async function endRole(actor: Actor, { membershipId, reason }: EndRoleInput, clock: Clock): Promise<void> {
  const chain = await inSnapshot((tx) => chainOf(membershipId, tx));
  return performAct(actor, clock, { act: "end_role", chain }, async (tx, record, at) => {
    authorize(actor, { on: "Installation", action: "end_role" });
    const membership = await Membership.findByPk(membershipId, { transaction: tx });
    if (!membership) throw new Refusal("not_found", "Nobody holds this role.");
    if (membership.untilAt !== null) throw new Refusal("wrong_state", "This role has ended already.");
    await membership.update({ untilAt: at }, { transaction: tx });
    const user = await User.findByPk(membership.userId, { attributes: ["name"], transaction: tx });
    record({
      act: "end_role",
      subject: { type: "person", id: String(membership.userId), label: user?.name ?? "" },
      was: { role: membership.role, from: membership.fromAt },
      now: { role: membership.role, from: membership.fromAt, until: at },
      reason,
    });
  });
}

/** Which history a refusal stands in. */
async function chainOf(membershipId: number, tx: Transaction): Promise<string> {
  const membership = await Membership.findByPk(membershipId, { transaction: tx });
  return membership ? (await productById(membership.productId, tx)).code : HOUSE_CHAIN;
}

import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import { productById } from "@/lib/budget/load-budget";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { Deputy } from "@/models/deputy";
import { User } from "@/models/user";
import { authorize } from "@/policies/authorize";
import type { EndDeputyInput } from "./schema";

/** Ends a deputyship before its last day. What was signed under it stays. */
export async function endDeputy(actor: Actor, { deputyshipId }: EndDeputyInput, clock: Clock): Promise<void> {
  const chain = await inSnapshot((tx) => chainOf(deputyshipId, tx));
  return performAct(actor, clock, { act: "end_deputy", chain }, async (tx, record, at) => {
    const deputy = await Deputy.findByPk(deputyshipId, { transaction: tx });
    if (!deputy) throw new Refusal("not_found", "There is no such deputy.");
    const { productId, holderId } = deputy;
    authorize(actor, { on: "Deputyship", action: "end", productId, holderId });
    if (deputy.endedAt !== null) throw new Refusal("wrong_state", "This has ended already.");
    await deputy.update({ endedAt: at }, { transaction: tx });
    const user = await User.findByPk(deputy.deputyId, { attributes: ["name"], transaction: tx });
    const was = { deputyFor: actor.printedName, from: deputy.fromDay, until: deputy.untilDay };
    record({
      act: "end_deputy",
      subject: { type: "person", id: String(deputy.deputyId), label: user?.name ?? "" },
      was,
      now: { ended: at },
    });
  });
}

async function chainOf(deputyshipId: number, tx: Transaction): Promise<string> {
  const deputy = await Deputy.findByPk(deputyshipId, { transaction: tx });
  return deputy ? (await productById(deputy.productId, tx)).code : HOUSE_CHAIN;
}

import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import { itemsBehind } from "@/lib/evaluation/budget/items-behind";
import type { ProposalAct } from "../records/act-on-proposal";
import { mailFacts, mailMany } from "./mails";

/** Tells the owners of plates that another one, ahead of theirs, has changed; who edited that knows it already. */
export async function mailDownstream(
  context: ProposalAct,
  { issue, state, changedItems }: { issue: number; state: BudgetState; changedItems: readonly string[] },
): Promise<void> {
  const { items } = indexState(state);
  const byOwner = new Map<number, string[]>();
  for (const { item, ahead } of itemsBehind(changedItems, items)) {
    const body = items.get(item);
    if (!body) continue;
    byOwner.set(body.ownerId, [...(byOwner.get(body.ownerId) ?? []), `${item} ${body.name}, behind ${ahead}`]);
  }

  const { editorIds } = context.proposal;
  for (const [owner, behind] of byOwner) {
    if (editorIds.includes(owner)) continue;
    await mailMany(context, {
      template: "ahead_changed",
      occasion: "a plate ahead changed",
      to: [owner],
      except: null,
      data: { ...mailFacts(context.proposal), issue, behind },
    });
  }
}

import type { Actor } from "@/lib/vocabulary/actor";
import type { Comment } from "@/models/comment";
import type { ProposalAct } from "../records/act-on-proposal";
import { editorsOf, mailFacts, mailMany } from "./mails";

/**
 * A request for action goes to the editors, an answer to who raised the remark, and any remark to whom it is addressed;
 * nobody gets two mails of one remark.
 */
export async function mailRemark(
  actor: Actor,
  context: ProposalAct,
  { remark, number, parent, to }: { remark: Comment; number: number; parent: Comment | null; to: readonly number[] },
): Promise<void> {
  const data = { ...mailFacts(context.proposal), authorName: actor.printedName, remarkNumber: number };
  const mail = { occasion: `remark ${remark.id}`, except: actor, data };
  if (parent) await mailMany(context, { ...mail, template: "remark_answered", to: [parent.authorId] });
  else if (remark.asksAction) {
    await mailMany(context, { ...mail, template: "remark_asks_action", to: editorsOf(context.proposal) });
  }
  await mailMany(context, { ...mail, template: "remark_addressed", to });
}

export function mailSettled(actor: Actor, context: ProposalAct, remark: Comment): Promise<number> {
  return mailMany(context, {
    template: "remark_settled",
    occasion: `remark ${remark.id} settled`,
    to: editorsOf(context.proposal),
    except: actor,
    data: { ...mailFacts(context.proposal), authorName: actor.printedName, remarkNumber: remark.number ?? 0 },
  });
}

import { membersAt } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { ProposalCoeditor } from "@/models/proposal-coeditor";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { isOpen, wrongStateSentence } from "../records/moves";
import { roundSignedBy } from "../records/note-editor";
import type { ShareDraftInput } from "../schema";

/** Names a co-editor, who sees and edits the working copy from now on and can never sign it. */
export function shareDraft(
  actor: Actor,
  { proposalId, userId }: ShareDraftInput,
  clock: Clock = systemClock,
): Promise<void> {
  return actOnProposal(actor, clock, { act: "share_draft", proposalId }, async ({ tx, at, proposal, record }) => {
    const { productId, proposerId } = proposal;
    authorize(actor, { on: "Draft", action: "share", productId, proposerId, isEditor: false });
    if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    const member = (await membersAt(productId, at, tx)).find((each) => each.userId === userId);
    const mayEdit = member?.roles.some((role) => role === "component_owner" || role === "program_manager");
    if (!member || !mayEdit) {
      throw invalid("Name a component owner or a program manager of this product.");
    }
    if (userId === proposerId) throw invalid("The proposer edits it already.");
    if (proposal.coEditorIds.includes(userId)) return;
    if ((await roundSignedBy(proposal.id, userId, tx)) !== null) {
      throw invalid(`${member.printedName} has signed this proposal: who signs it does not edit it.`);
    }

    await ProposalCoeditor.create(
      { proposalId: proposal.id, userId, namedById: actor.userId, namedAt: at },
      { transaction: tx },
    );
    record({ now: { coEditor: member.printedName } });
  });
}

function invalid(sentence: string): Refusal {
  return new Refusal("invalid", sentence, [{ path: "userId", sentence }]);
}

import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { ProposalCoeditor } from "@/models/proposal-coeditor";
import { User } from "@/models/user";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { isOpen, wrongStateSentence } from "../records/moves";
import type { ShareDraftInput } from "../schema";

/** Ends a co-editor's part in the working copy. What they edited stays, and so does that they can never sign it. */
export function unshareDraft(
  actor: Actor,
  { proposalId, userId }: ShareDraftInput,
  clock: Clock = systemClock,
): Promise<void> {
  return actOnProposal(actor, clock, { act: "unshare_draft", proposalId }, async ({ tx, at, proposal, record }) => {
    const { productId, proposerId } = proposal;
    authorize(actor, { on: "Draft", action: "share", productId, proposerId, isEditor: false });
    if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    const sharing = await ProposalCoeditor.findOne({ where: { proposalId, userId, endedAt: null }, transaction: tx });
    if (!sharing) {
      const sentence = "This person is no co-editor here.";
      throw new Refusal("not_found", sentence, [{ path: "userId", sentence }]);
    }
    await sharing.update({ endedAt: at }, { transaction: tx });
    const user = await User.findByPk(userId, { attributes: ["name"], transaction: tx });
    record({ was: { coEditor: user?.name ?? "" } });
  });
}

import type { Actor } from "@/lib/vocabulary/actor";
import type { ProposalAct } from "../records/act-on-proposal";
import { budgetReader } from "../records/budget-reader";
import { citedInRounds } from "../records/cited-files";
import type { FileRecord } from "../records/file-records";
import { editorsOf, mailFacts, mailMany } from "./mails";
import { isOpen } from "../records/moves";
import { proposalById } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { reviewRound } from "../review/round-review";

type Context = Pick<ProposalAct, "tx" | "at" | "proposal">;

export async function mailEvidenceAdded(actor: Actor, context: Context, fileId: number): Promise<void> {
  await mailConcerned(actor, context, { template: "evidence_added", occasion: `file ${fileId} added` });
}

/** Of every open round that cites the file, and of the proposal that it stands beside. */
export async function mailEvidenceVoided(
  actor: Actor,
  { id, productId, place, proposalId, sha256 }: FileRecord,
  { tx, at }: Pick<Context, "tx" | "at">,
): Promise<void> {
  const citing = (await citedInRounds(productId, tx)).filter((each) => each.sha256 === sha256);
  const concerned = new Set([...citing.map((each) => each.proposalId), ...(place === "proposal" ? [proposalId] : [])]);
  for (const each of concerned) {
    const proposal = await proposalById(each, tx);
    const isInRound = citing.some((cited) => cited.proposalId === each && cited.round === proposal.round);
    if (!isOpen(proposal.state) || (!isInRound && each !== proposalId)) continue;
    const mail = { template: "evidence_voided", occasion: `file ${id} voided` } as const;
    await mailConcerned(actor, { tx, at, proposal }, mail);
  }
}

/** Those who edit, who may sign the round that is open, and who signed it. */
async function mailConcerned(
  actor: Actor,
  context: Context,
  mail: { template: "evidence_added" | "evidence_voided"; occasion: string },
): Promise<void> {
  const { proposal, tx, at } = context;
  const round = await roundOf(proposal.id, proposal.round, tx);
  if (!round) return;
  const { routing, signatures } = await reviewRound(proposal, round, budgetReader(proposal.productId, tx), { at, tx });
  const may = proposal.state === "proposed" ? routing.flatMap(({ maySign }) => maySign) : [];
  const signed = signatures.filter(({ roundId }) => roundId === round.id);
  await mailMany(context, {
    ...mail,
    to: [...editorsOf(proposal), ...may.map(({ userId }) => userId), ...signed.map(({ signerId }) => signerId)],
    except: actor,
    data: { ...mailFacts(proposal), actorName: actor.printedName },
  });
}

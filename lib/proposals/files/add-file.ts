import { discardUnheld, keepFile } from "@/lib/evidence/keep-file";
import { receiveFile, type ReceivedFile } from "@/lib/evidence/receive-file";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Attachment } from "@/models/attachment";
import { authorize } from "@/policies/authorize";
import { actOnProposal, type ProposalAct } from "../records/act-on-proposal";
import { readableFiles } from "../records/file-records";
import { mailEvidenceAdded } from "../notices/mail-evidence";
import { isOpen, wrongStateSentence } from "../records/moves";
import { noteEditor } from "../records/note-editor";
import { proposalQuestion } from "../records/proposal-record";
import type { AddFileInput } from "../schema";

export interface AddedFile {
  /** "held": the product had this very content already, nothing was stored twice. */
  outcome: "added" | "held";
  fileId: number;
  name: string;
  sha256: string;
  sourceDate: string;
}

const MOST_FILES = 100;

/**
 * Takes a file into a working copy, for its citations, or beside a submitted proposal. Who may not is told before a
 * byte is read; what fails after that leaves neither row nor file.
 */
export async function addFile(
  actor: Actor,
  input: AddFileInput,
  content: AsyncIterable<Uint8Array>,
  clock: Clock = systemClock,
): Promise<AddedFile> {
  const frame = { act: "add_attachment", proposalId: input.proposalId } as const;
  await actOnProposal(actor, clock, frame, (context) => demandPlace(actor, context, input));
  return receiveFile(content, async (file) => {
    try {
      return await actOnProposal(actor, clock, frame, async (context) => {
        await demandPlace(actor, context, input);
        return (await heldAlready(actor, context, input, file)) ?? (await written(actor, context, input, file));
      });
    } catch (problem) {
      await discardUnheld(file.sha256);
      throw problem;
    }
  });
}

/** Into a working copy by its editors; beside what was submitted by whoever takes part. */
async function demandPlace(
  actor: Actor,
  { proposal, tx }: ProposalAct,
  { place, productCode }: AddFileInput,
): Promise<void> {
  const { productId, state, round } = proposal;
  if (proposal.productCode !== productCode) throw new Refusal("not_found", "There is no such proposal here.");
  authorize(
    actor,
    place === "working_copy"
      ? proposalQuestion(proposal, actor, "edit")
      : { on: "Product", action: "add_file", productId },
  );
  if (!isOpen(state) || (place === "proposal" && round === 0)) {
    throw new Refusal("wrong_state", wrongStateSentence(state));
  }
  const held = await Attachment.count({ where: { ownerId: proposal.id }, transaction: tx });
  if (held >= MOST_FILES) throw new Refusal("invalid", `One proposal brings at most ${MOST_FILES} files.`);
}

/** The same content is cited again, not sent again; a voided one stays voided. */
async function heldAlready(
  actor: Actor,
  { proposal, tx }: ProposalAct,
  { place }: AddFileInput,
  { sha256 }: ReceivedFile,
): Promise<AddedFile | null> {
  const same = (await readableFiles(actor, proposal.productId, tx)).filter((file) => file.sha256 === sha256);
  const voided = same.find(({ voidedAt }) => voidedAt !== null);
  if (voided) {
    const sentence = `This very file was voided by ${voided.voidedBy ?? ""}: “${voided.voidReason ?? ""}”`;
    throw new Refusal("invalid", sentence, [{ path: "file", sentence }]);
  }
  const usable = same.find((file) => place === "working_copy" || file.proposalId === proposal.id);
  if (!usable) return null;
  const { id: fileId, name, sourceDate } = usable;
  return { outcome: "held", fileId, name, sha256, sourceDate };
}

async function written(
  actor: Actor,
  context: ProposalAct,
  { place, name, sourceDate }: AddFileInput,
  file: ReceivedFile,
): Promise<AddedFile> {
  const { proposal, tx, at, record } = context;
  const { sha256, size, type: mediaType } = file;
  const facts = { productId: proposal.productId, ownerType: place, ownerId: proposal.id };
  const { id: fileId } = await Attachment.create(
    { ...facts, name, mediaType, size, sha256, sourceDate, addedById: actor.userId, addedAt: at },
    { transaction: tx },
  );
  if (place === "working_copy") await noteEditor(proposal.id, actor.userId, at, tx);
  // A working copy is its editors' own: the history keeps the content's hash and, bound by it, the row.
  const content = { file: fileId, mediaType, size, sha256 };
  record({ now: place === "proposal" ? { ...content, name, sourceDate } : content });
  if (place === "proposal") await mailEvidenceAdded(actor, context, fileId);
  await keepFile(file);
  return { outcome: "added", fileId, name, sha256, sourceDate };
}

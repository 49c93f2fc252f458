import { performAct } from "@/lib/audit/perform-act";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Attachment } from "@/models/attachment";
import { inSnapshot } from "@/models/database";
import { authorize } from "@/policies/authorize";
import type { Transaction } from "sequelize";
import { fileById, readableFiles, type FileRecord } from "../records/file-records";
import { mailEvidenceVoided } from "../notices/mail-evidence";
import { proposalById } from "../records/proposal-record";
import type { VoidFileInput } from "../schema";

/** Marks a file as not to be relied on, with the reason. It stays where it is and can be read as before. */
export async function voidFile(
  actor: Actor,
  { fileId, reason }: VoidFileInput,
  clock: Clock = systemClock,
): Promise<void> {
  const { productCode } = await inSnapshot(async (tx) => proposalById((await named(fileId, tx)).proposalId, tx));
  const subject = { type: "file", id: String(fileId), label: `File ${fileId}` };
  const frame = { act: "void_attachment", chain: productCode, subject } as const;
  await performAct(actor, clock, frame, async (tx, record, at) => {
    const file = await named(fileId, tx);
    const { productId, addedById, sha256 } = file;
    authorize(actor, { on: "Product", action: "read_budget", productId });
    if (!(await readableFiles(actor, productId, tx)).some(({ id }) => id === fileId)) throw noSuchFile();
    authorize(actor, { on: "File", action: "void", productId, addedById });
    if (file.voidedAt !== null) throw new Refusal("wrong_state", "This file has been voided already.");
    const voided = { voidedById: actor.userId, voidedAt: at, voidReason: reason };
    await Attachment.update(voided, { where: { id: fileId }, transaction: tx });
    record({ act: frame.act, subject, was: { voided: false }, now: { voided: true, sha256 }, reason });
    await mailEvidenceVoided(actor, file, { tx, at });
  });
}

async function named(fileId: number, tx: Transaction): Promise<FileRecord> {
  const file = await fileById(fileId, tx);
  if (!file) throw noSuchFile();
  return file;
}

export function noSuchFile(): Refusal {
  return new Refusal("not_found", "There is no such file.");
}

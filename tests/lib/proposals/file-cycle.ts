import { existsSync, readdirSync } from "node:fs";
import { filesFolder } from "@/lib/evidence/file-places";
import { addFile, type AddedFile } from "@/lib/proposals/files/add-file";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import type { Actor } from "@/lib/vocabulary/actor";
import { inPieces, samplePdf } from "@/tests/support/sample-files";
import { adding, CODE, content, formKey, type Team } from "./review-cycle";

export const DATE = "2026-02-10";

export function adds(
  actor: Actor,
  { clock }: Team,
  proposalId: number,
  more: { bytes?: Buffer; name?: string; beside?: true } = {},
) {
  const { bytes = samplePdf(), name = "record 12.pdf", beside } = more;
  const place = beside ? ("proposal" as const) : ("working_copy" as const);
  return addFile(actor, { productCode: CODE, proposalId, place, name, sourceDate: DATE }, inPieces(bytes), clock);
}

export function citing({ name, sha256 }: AddedFile) {
  return {
    grade: "preliminary",
    evidence: [{ document: "Record 12", revision: "A", date: DATE, file: { name, sha256 } }],
  };
}

export async function draft(actor: Actor, { clock }: Team) {
  const { proposalId } = await startDraft(actor, { productCode: CODE, title: "", key: formKey() }, clock);
  return proposalId;
}

/** A draft of Tansy's with a new item that cites the file, submitted. */
export async function submittedWithFile(people: Team, bytes = samplePdf()) {
  const { tansy, clock } = people;
  const proposalId = await draft(tansy, people);
  const file = await adds(tansy, people, proposalId, { bytes });
  const edits = [adding("010", tansy.userId, 0.5, citing(file))];
  await saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
  await propose(tansy, { proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
  return { proposalId, file };
}

/** Names of all files below the folder of files. */
export function onDisk(): string[] {
  if (!existsSync(filesFolder())) return [];
  return readdirSync(filesFolder(), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map(({ name }) => name);
}

import { Readable } from "node:stream";
import { addFile } from "@/lib/proposals/files/add-file";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { AddFileInput, SaveDraftInput, type DraftContent } from "@/lib/proposals/schema";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import type { DemoFile } from "./demo-files";
import type { Desk } from "./desk";
import type { DemoPerson } from "./people";
import { lockVersionOf } from "./shown-sheet";

/** What a person of the demo proposes: the form as they would fill it. */
export type DemoChange = Pick<DraftContent, "title" | "reason"> & {
  edits?: readonly unknown[];
  transfers?: readonly unknown[];
  neededBy?: string;
  /** Files that its citations name, each with the date of its source. */
  files?: readonly { file: DemoFile; sourceDate: string }[];
};

export function draftingActs({ house, productCode, key, deliverMail }: Desk) {
  /** A working copy; it stays one until it is submitted. */
  async function draft(person: DemoPerson, change: DemoChange): Promise<number> {
    const input = { productCode, title: change.title, key: key() };
    const { proposalId } = await startDraft(await house.actor(person), input, house.clock);
    for (const each of change.files ?? []) await addTo(person, proposalId, each.file, each.sourceDate);
    await save(person, proposalId, change);
    return proposalId;
  }

  async function addTo(person: DemoPerson, proposalId: number, { name, content }: DemoFile, sourceDate: string) {
    const input = AddFileInput.parse({ productCode, proposalId, place: "working_copy", name, sourceDate });
    await addFile(await house.actor(person), input, Readable.from([content]), house.clock);
  }

  async function save(person: DemoPerson, proposalId: number, { files: _, ...change }: DemoChange): Promise<void> {
    const content = { neededBy: null, edits: [], transfers: [], ...change };
    const input = SaveDraftInput.parse({ proposalId, lockVersion: await lockVersionOf(proposalId), content });
    await saveDraft(await house.actor(person), input, house.clock);
  }

  async function submit(person: DemoPerson, change: DemoChange): Promise<number> {
    const proposalId = await draft(person, change);
    await proposeIt(person, proposalId);
    return proposalId;
  }

  /** The next round, with what was changed since. */
  async function submitAgain(person: DemoPerson, proposalId: number, change: DemoChange): Promise<void> {
    await save(person, proposalId, change);
    await proposeIt(person, proposalId);
  }

  async function proposeIt(person: DemoPerson, proposalId: number): Promise<void> {
    const input = { proposalId, lockVersion: await lockVersionOf(proposalId), key: key(), password: null };
    await propose(await house.actor(person), input, house.clock);
    await deliverMail();
  }

  return { draft, submit, submitAgain };
}

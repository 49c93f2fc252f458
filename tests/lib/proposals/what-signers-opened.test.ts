import { describe, expect, it } from "vitest";
import { addFile } from "@/lib/proposals/files/add-file";
import { itemFiles } from "@/lib/proposals/reading/item-files";
import { fileToOpen, noteOpening } from "@/lib/proposals/files/open-file";
import { openLineHistory } from "@/lib/proposals/reading/open-line-history";
import { proposalView } from "@/lib/proposals/queries";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { propose } from "@/lib/proposals/submitting/propose";
import type { Actor } from "@/lib/vocabulary/actor";
import { Looking } from "@/models/looking";
import { Proposal } from "@/models/proposal";
import { withDatabase } from "@/tests/support/database";
import { inPieces, sampleCsv } from "@/tests/support/sample-files";
import { adds, citing, DATE, draft, submittedWithFile } from "./file-cycle";
import {
  adding,
  approvedItems,
  approves,
  CODE,
  content,
  formKey,
  proposed,
  revising,
  team,
  type Team,
} from "./review-cycle";

withDatabase();

async function opens(actor: Actor, fileId: number, { clock }: Team) {
  const { file } = await fileToOpen(actor, CODE, fileId);
  await noteOpening(actor, file, clock);
}

async function evidenceOf(reader: Actor, key: string, { clock }: Team) {
  const view = await proposalView(reader, CODE, key, undefined, clock);
  if (!view) throw new Error(`There is no proposal ${key}.`);
  return view.evidence;
}

describe("what signers opened", () => {
  it("stands beside each signer with the first time, and “not opened” where nothing was", async () => {
    const people = await team();
    const { ines, elske, maud } = people;
    const { file } = await submittedWithFile(people);
    await opens(ines, file.fileId, people);
    await opens(ines, file.fileId, people);
    const { signers, cited } = await evidenceOf(maud, "1", people);
    expect(cited).toMatchObject([
      { line: { number: "010" }, document: "Record 12", isNew: true, file: { sha256: file.sha256 } },
    ]);
    const of = ({ userId }: Actor) => signers.find(({ person }) => person.id === userId)?.files;
    expect(of(ines)).toMatchObject([{ name: "record 12.pdf", at: expect.stringMatching(/^2026-03-01T/) }]);
    expect(of(elske)).toMatchObject([{ at: null }]);
    const row = await Looking.findOne({ where: { userId: ines.userId, kind: "file", subject: `file ${file.fileId}` } });
    expect(row && row.firstAt < row.lastAt).toBe(true);
  });

  it("counts for the round that was open when it was opened, and stays with it after the decision", async () => {
    const people = await team();
    const { tansy, ines, lusia, clock } = people;
    const { file, proposalId } = await submittedWithFile(people);
    await opens(ines, file.fileId, people);
    const { lockVersion } = await Proposal.findByPk(proposalId, { rejectOnEmpty: true });
    const edits = [adding("010", tansy.userId, 0.4, citing(file))];
    await saveDraft(tansy, { proposalId, lockVersion, content: content({ edits }) }, clock);
    await propose(tansy, { proposalId, lockVersion: lockVersion + 1, key: formKey(), password: null }, clock);
    const at = async () => {
      const { signers } = await evidenceOf(lusia, "1", people);
      return signers.find(({ person }) => person.id === ines.userId)?.files[0]?.at;
    };
    expect(await at()).toBeNull();
    await opens(ines, file.fileId, people);
    const opened = await at();
    await approves(ines, proposalId, "reviewer", clock);
    await approves(lusia, proposalId, "program_manager", clock);
    await opens(ines, file.fileId, people);
    expect(opened).toMatch(/^2026-03-01T/);
    expect(await at()).toBe(opened);
  });

  it("includes a file that a reviewer put beside the proposal, which bars them from nothing", async () => {
    const people = await team();
    const { tansy, ines, elske, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const input = { productCode: CODE, proposalId, place: "proposal" as const, name: "check.csv", sourceDate: DATE };
    const added = await addFile(ines, input, inPieces(sampleCsv()), clock);
    await opens(elske, added.fileId, people);
    const { beside, signers } = await evidenceOf(elske, "1", people);
    expect(beside).toMatchObject([{ name: "check.csv", mediaType: "text/csv", addedBy: "Ines Reviewer" }]);
    expect(signers.find(({ person }) => person.id === elske.userId)?.files[0]?.at).not.toBeNull();
    await approves(ines, proposalId, "reviewer", clock);
  });
});

describe("the change history of an edited line", () => {
  it("is given with letter, date, who and why, and that it was opened is shown to manager and auditor", async () => {
    const people = await team();
    const { tansy, odo, ines, lusia, maud, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const proposalId = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.4)] });
    const revisions = await openLineHistory(ines, { proposalId, kind: "item", number: "010" }, clock);
    expect(revisions).toMatchObject([
      { letter: "–", issue: { number: 2, proposal: { label: "TF-2-CP-01", title: "New items" } } },
    ]);

    const histories = async (reader: Actor) => {
      const { signers } = await evidenceOf(reader, "2", people);
      return signers.find(({ person }) => person.id === ines.userId)?.histories ?? null;
    };
    for (const reader of [lusia, maud]) {
      expect(await histories(reader)).toMatchObject([{ line: { number: "010" }, at: expect.stringMatching(/^2026-/) }]);
    }
    for (const reader of [tansy, odo, ines]) expect(await histories(reader)).toBeNull();
  });

  it("of a line that the proposal does not edit leaves no trace, and of another's draft is refused", async () => {
    const people = await team();
    const { tansy, odo, ines, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.1)], people.fenno);
    const proposalId = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.4)] });
    await openLineHistory(ines, { proposalId, kind: "item", number: "020" }, clock);
    expect(await Looking.count({ where: { kind: "line history" } })).toBe(0);
    const hidden = await draft(tansy, people);
    await expect(
      openLineHistory(ines, { proposalId: hidden, kind: "item", number: "010" }, clock),
    ).rejects.toMatchObject({ code: "forbidden" });
  });
});

describe("the files of an item", () => {
  it("are all that any letter cited, with the letter by which each came and the last that cites it", async () => {
    const people = await team();
    const { tansy, ines, lusia, maud, clock } = people;
    const { file, proposalId } = await submittedWithFile(people);
    await approves(ines, proposalId, "reviewer", clock);
    await approves(lusia, proposalId, "program_manager", clock);
    const next = await draft(tansy, people);
    const table = await adds(tansy, people, next, { bytes: sampleCsv(), name: "runs.csv" });
    const edits = [revising("010", "–", tansy.userId, 0.49, citing(table))];
    await saveDraft(tansy, { proposalId: next, lockVersion: 0, content: content({ edits }) }, clock);
    await propose(tansy, { proposalId: next, lockVersion: 1, key: formKey(), password: null }, clock);
    await approves(ines, next, "reviewer", clock);

    const files = await itemFiles(maud, CODE, "010", 3);
    expect(files.map(({ file: { name }, fromLetter, untilLetter }) => [name, fromLetter, untilLetter])).toEqual([
      ["record 12.pdf", "–", "–"],
      ["runs.csv", "A", "A"],
    ]);
    expect(files[0]?.file.sha256).toBe(file.sha256);
    expect(await itemFiles(maud, CODE, "010", 2)).toHaveLength(1);
  });
});

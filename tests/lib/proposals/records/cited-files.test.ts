import { describe, expect, it } from "vitest";
import { fileToOpen } from "@/lib/proposals/files/open-file";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { voidFile } from "@/lib/proposals/files/void-file";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import type { Actor } from "@/lib/vocabulary/actor";
import { Proposal } from "@/models/proposal";
import { withDatabase } from "@/tests/support/database";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import { sampleCsv } from "@/tests/support/sample-files";
import { adds, citing, draft, submittedWithFile } from "../file-cycle";
import { adding, approves, CODE, content, formKey, proposed, reviewOf, revising, team } from "../review-cycle";

withDatabase();

describe("reading a file", () => {
  it("is the draft's editors' own until a submitted round cites it, then every member's, and stays so", async () => {
    const people = await team();
    const { tansy, odo, ines, maud, clock } = people;
    const proposalId = await draft(tansy, people);
    const file = await adds(tansy, people, proposalId);
    const reads = (actor: Actor) => fileToOpen(actor, CODE, file.fileId);
    for (const actor of [odo, ines, maud]) await expect(reads(actor)).rejects.toMatchObject({ code: "not_found" });
    await shareDraft(tansy, { proposalId, userId: odo.userId }, clock);
    expect((await reads(odo)).file.sha256).toBe(file.sha256);

    const edits = [adding("010", tansy.userId, 0.5, citing(file))];
    await saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
    await propose(tansy, { proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
    await withdrawProposal(tansy, { proposalId, reason: "Not needed." }, clock);
    for (const actor of [ines, maud]) expect((await reads(actor)).file.sha256).toBe(file.sha256);
    await expect(fileToOpen({ ...maud, memberships: [] }, CODE, file.fileId)).rejects.toMatchObject({
      code: "forbidden",
    });
  });
});

describe("citing a file", () => {
  it("is bound by the round's hash: another content or name is another round", async () => {
    const people = await team();
    const { tansy, clock } = people;
    const proposalId = await draft(tansy, people);
    const cited = await adds(tansy, people, proposalId);
    const more = await adds(tansy, people, proposalId, { bytes: sampleCsv(), name: "runs.csv" });
    const hashes: string[] = [];
    for (const file of [cited, more]) {
      const edits = [adding("010", tansy.userId, 0.5, citing(file))];
      const { lockVersion } = await Proposal.findByPk(proposalId, { rejectOnEmpty: true });
      await saveDraft(tansy, { proposalId, lockVersion, content: content({ edits }) }, clock);
      await propose(tansy, { proposalId, lockVersion: lockVersion + 1, key: formKey(), password: null }, clock);
      const { round } = await reviewOf(proposalId, clock);
      hashes.push(round.hash);
    }
    expect(new Set(hashes).size).toBe(2);
  });

  it("is refused at its field where the product holds no such file, or one that was voided", async () => {
    const people = await team();
    const { tansy, clock } = people;
    const { file, proposalId: first } = await submittedWithFile(people);
    await withdrawProposal(tansy, { proposalId: first, reason: "Wrong record." }, clock);
    await voidFile(tansy, { fileId: file.fileId, reason: "It is the record of another part." }, clock);
    const unknown = { ...file, sha256: "0".repeat(64) };
    for (const [number, cited, sentence] of [
      ["020", unknown, /holds no file record 12\.pdf/],
      ["030", { ...file, name: "other.pdf" }, /holds no file other\.pdf/],
      ["040", file, /voided by Tansy Owner: “It is the record of another part\.”/],
    ] as const) {
      const edits = [adding(number, tansy.userId, 0.5, citing(cited))];
      await expect(proposed(tansy, clock, { edits })).rejects.toMatchObject({
        code: "invalid",
        faults: [{ path: "edits.0.body.evidence.0.file", sentence: expect.stringMatching(sentence) }],
      });
    }
    await expect(adds(tansy, people, await draft(tansy, people))).rejects.toMatchObject({
      message: expect.stringContaining("It is the record of another part."),
    });
  });

  it("stays with the item that was approved with it, also after it was voided", async () => {
    const people = await team();
    const { tansy, ines, lusia, clock } = people;
    const { file, proposalId } = await submittedWithFile(people);
    await approves(ines, proposalId, "reviewer", clock);
    await approves(lusia, proposalId, "program_manager", clock);
    await voidFile(lusia, { fileId: file.fileId, reason: "Superseded by record 14." }, clock);
    const next = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.4, citing(file))] });
    expect(next).toBeGreaterThan(proposalId);
    expect((await fileToOpen(ines, CODE, file.fileId)).file.voidReason).toBe("Superseded by record 14.");
    expect(await invariantFaults()).toEqual([]);
  });
});

import { mkdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { filesFolder, incomingFolder, placeOf } from "@/lib/evidence/file-places";
import { keepFile, sweepIncoming } from "@/lib/evidence/keep-file";
import { receiveFile } from "@/lib/evidence/receive-file";
import { addFile } from "@/lib/proposals/files/add-file";
import { fileToOpen } from "@/lib/proposals/files/open-file";
import { voidFile } from "@/lib/proposals/files/void-file";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import type { Actor } from "@/lib/vocabulary/actor";
import { Attachment } from "@/models/attachment";
import { withDatabase } from "@/tests/support/database";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import { product, withRole } from "@/tests/support/people";
import { inPieces, sampleCsv, samplePdf } from "@/tests/support/sample-files";
import { adds, DATE, draft, onDisk, submittedWithFile } from "./file-cycle";
import { adding, CODE, proposed, team } from "./review-cycle";

withDatabase();

describe("adding a file", () => {
  it("keeps content, row and history entry together, and answers the same bytes again", async () => {
    const people = await team();
    const proposalId = await draft(people.tansy, people);
    const bytes = samplePdf();
    const { outcome, fileId, sha256 } = await adds(people.tansy, people, proposalId, { bytes });
    expect(outcome).toBe("added");
    expect(onDisk()).toEqual([sha256]);
    const { file, path: place } = await fileToOpen(people.tansy, CODE, fileId);
    expect(readFileSync(place).equals(bytes)).toBe(true);
    expect(file).toMatchObject({ mediaType: "application/pdf", size: bytes.length, sourceDate: DATE, voidedAt: null });
    const { rows } = await historyPage({ act: "add_attachment" });
    expect(rows.map(({ outcome: done, now }) => ({ done, now }))).toMatchObject([{ done: "done", now: { sha256 } }]);
    // A draft is its editors' own: its file's name stands in no entry.
    expect(JSON.stringify(rows)).not.toContain("record 12");
    expect(await invariantFaults()).toEqual([]);
  });

  it("goes by the content where the name lies", async () => {
    const people = await team();
    const proposalId = await draft(people.tansy, people);
    const { fileId } = await adds(people.tansy, people, proposalId, { name: "photo.png" });
    expect((await fileToOpen(people.tansy, CODE, fileId)).file.mediaType).toBe("application/pdf");
  });

  it("stores the same content once, also when it comes twice at the same moment", async () => {
    const people = await team();
    const proposalId = await draft(people.tansy, people);
    const both = await Promise.all([1, 2].map(() => adds(people.tansy, people, proposalId)));
    expect(both.map(({ outcome }) => outcome).sort()).toEqual(["added", "held"]);
    expect(new Set(both.map(({ fileId }) => fileId)).size).toBe(1);
    const another = await adds(people.tansy, people, await draft(people.tansy, people), { name: "again.pdf" });
    expect(another).toMatchObject({ outcome: "held", name: "record 12.pdf" });
    expect(await Attachment.count()).toBe(1);
    expect(onDisk()).toHaveLength(1);
  });

  it("leaves neither row nor file of a stream that breaks off", async () => {
    const people = await team();
    const proposalId = await draft(people.tansy, people);
    async function* broken() {
      yield samplePdf().subarray(0, 50);
      throw new Error("The other side is gone.");
    }
    const input = { productCode: CODE, proposalId, place: "working_copy" as const, name: "a.pdf", sourceDate: DATE };
    await expect(addFile(people.tansy, input, broken(), people.clock)).rejects.toThrow("gone");
    expect(await Attachment.count()).toBe(0);
    expect(onDisk()).toEqual([]);
    expect(await invariantFaults()).toEqual([]);
  });

  it("leaves neither row nor file where the draft was withdrawn while the bytes came", async () => {
    const people = await team();
    const { tansy, clock } = people;
    const proposalId = await draft(tansy, people);
    async function* slow() {
      yield samplePdf();
      await withdrawProposal(tansy, { proposalId, reason: "Not needed." }, clock);
    }
    const input = { productCode: CODE, proposalId, place: "working_copy" as const, name: "a.pdf", sourceDate: DATE };
    await expect(addFile(tansy, input, slow(), clock)).rejects.toMatchObject({ code: "wrong_state" });
    expect(await Attachment.count()).toBe(0);
    expect(onDisk()).toEqual([]);
  });

  it("is refused to an auditor, to others' drafts and from another product before a byte is read", async () => {
    const people = await team();
    const { tansy, odo, ines, maud, clock } = people;
    const open = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const hidden = await draft(tansy, people);
    await product("SP-9");
    const stranger = await withRole({ ...maud, memberships: [] }, "SP-9", "program_manager");
    async function* unread(): AsyncGenerator<Uint8Array> {
      throw new Error("A byte was read.");
    }
    const tries: [Actor, number, "working_copy" | "proposal", string][] = [
      [maud, open, "proposal", "forbidden"],
      [odo, hidden, "working_copy", "forbidden"],
      [ines, hidden, "working_copy", "forbidden"],
      [ines, open, "working_copy", "forbidden"],
      [stranger, open, "proposal", "forbidden"],
      [tansy, hidden, "proposal", "wrong_state"],
    ];
    for (const [actor, proposalId, place, code] of tries) {
      const input = { productCode: CODE, proposalId, place, name: "a.pdf", sourceDate: DATE };
      await expect(addFile(actor, input, unread(), clock)).rejects.toMatchObject({ code });
    }
    const elsewhere = {
      productCode: "SP-9",
      proposalId: open,
      place: "proposal" as const,
      name: "a.pdf",
      sourceDate: DATE,
    };
    await expect(addFile(ines, elsewhere, unread(), clock)).rejects.toMatchObject({ code: "not_found" });
    const { rows } = await historyPage({ act: "add_attachment" });
    expect(rows.map(({ outcome }) => outcome)).toEqual(tries.map(() => "refused"));
    expect(onDisk()).toEqual([]);
  });
});

describe("voiding a file", () => {
  it("is for who added it or a program manager, once, with a reason, and deletes nothing", async () => {
    const people = await team();
    const { odo, ines, maud, lusia, fenno, clock } = people;
    const { file } = await submittedWithFile(people);
    const reason = "The gauge was out of calibration.";
    for (const actor of [odo, ines, maud]) {
      await expect(voidFile(actor, { fileId: file.fileId, reason }, clock)).rejects.toMatchObject({
        code: "forbidden",
      });
    }
    await voidFile(lusia, { fileId: file.fileId, reason }, clock);
    await expect(voidFile(fenno, { fileId: file.fileId, reason }, clock)).rejects.toMatchObject({
      code: "wrong_state",
    });
    expect((await fileToOpen(maud, CODE, file.fileId)).file).toMatchObject({
      voidedBy: "Lusia Manager",
      voidReason: reason,
    });
    expect(onDisk()).toEqual([file.sha256]);
    const { rows } = await historyPage({ act: "void_attachment", outcome: "done" });
    expect(rows).toMatchObject([{ printedName: "Lusia Manager", reason, subjectLabel: `File ${file.fileId}` }]);
    expect(await invariantFaults()).toEqual([]);
  });

  it("of a file in another's draft is refused as if there were none", async () => {
    const people = await team();
    const file = await adds(people.tansy, people, await draft(people.tansy, people));
    await expect(voidFile(people.lusia, { fileId: file.fileId, reason: "No." }, people.clock)).rejects.toMatchObject({
      code: "not_found",
    });
  });
});

describe("what a stopped server left behind", () => {
  it("is removed at the next start, the file of a row is not", async () => {
    const people = await team();
    const kept = await adds(people.tansy, people, await draft(people.tansy, people));
    // Stopped after the file got its place and before its row was committed, and in the middle of another.
    await receiveFile(inPieces(sampleCsv()), async (file) => {
      await keepFile(file);
      writeFileSync(path.join(incomingFolder(), "left"), readFileSync(file.temporary));
    });
    writeFileSync(path.join(incomingFolder(), "half"), samplePdf().subarray(0, 90));
    writeFileSync(path.join(incomingFolder(), "same"), samplePdf());
    expect(onDisk()).toHaveLength(5);

    expect(await sweepIncoming()).toBe(3);
    expect(onDisk()).toEqual([kept.sha256]);
    expect(await invariantFaults()).toEqual([]);
  });
});

describe("the invariant of files", () => {
  it("sees a file that is gone, changed or nobody's", async () => {
    const people = await team();
    const { sha256, fileId } = await adds(people.tansy, people, await draft(people.tansy, people));
    writeFileSync(placeOf(sha256), "something else");
    mkdirSync(path.join(filesFolder(), "ab"), { recursive: true });
    writeFileSync(path.join(filesFolder(), "ab", "stray"), "");
    expect(await invariantFaults()).toEqual([
      `10: file ${fileId} holds something else on the disk.`,
      "10: the file stray has no row.",
    ]);
  });
});

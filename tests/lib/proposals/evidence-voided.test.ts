import { chmodSync, rmSync, writeFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { placeOf } from "@/lib/evidence/file-places";
import { verifyFiles } from "@/lib/evidence/verify-files";
import { proposalView } from "@/lib/proposals/queries";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { voidFile } from "@/lib/proposals/files/void-file";
import { inSnapshot } from "@/models/database";
import { OutboxMessage } from "@/models/outbox-message";
import { withDatabase } from "@/tests/support/database";
import { sampleCsv } from "@/tests/support/sample-files";
import { adds, submittedWithFile } from "./file-cycle";
import { approval, approves, CODE, team } from "./review-cycle";

withDatabase();

const reason = "The gauge was out of calibration.";

async function told(template: string): Promise<number[]> {
  const mails = await OutboxMessage.findAll({ where: { template }, order: ["toUserId"] });
  return mails.map(({ toUserId }) => toUserId);
}

describe("evidence that is voided while a round is open", () => {
  it("moves the text that is signed: who signs is told, looks again and reads whose file it was and why", async () => {
    const people = await team();
    const { tansy, ines, clock } = people;
    const { proposalId, file } = await submittedWithFile(people);
    const shown = await approval(proposalId, "reviewer", clock);
    await voidFile(tansy, { fileId: file.fileId, reason }, clock);

    await expect(signProposal(ines, shown, clock)).rejects.toMatchObject({ code: "moved" });
    const sheet = await proposalView(ines, CODE, "1", undefined, clock);
    expect(sheet?.voidedEvidence).toEqual([
      `record 12.pdf, cited for item 010, was voided by Tansy Owner: “${reason}”`,
    ]);
    expect(sheet?.signingSheet?.text).toContain(`evidence: record 12.pdf, cited for item 010, was voided`);
    // It warns: whoever read that may sign all the same.
    expect((await approves(ines, proposalId, "reviewer", clock)).state).toBe("proposed");
  });

  it("is told by mail to the editors, to who may sign and to who signed, and not to who did it", async () => {
    const people = await team();
    const { tansy, ines, elske, lusia, fenno, clock } = people;
    const { proposalId, file } = await submittedWithFile(people);
    await approves(ines, proposalId, "reviewer", clock);
    await voidFile(lusia, { fileId: file.fileId, reason }, clock);

    const concerned = [tansy, ines, elske, fenno].map(({ userId }) => userId);
    expect(await told("evidence_voided")).toEqual(concerned.sort((one, other) => one - other));
  });
});

describe("a file that is added beside an open proposal", () => {
  it("is told by mail to the editors and to who may sign, once", async () => {
    const people = await team();
    const { tansy, odo, ines, elske, lusia, fenno } = people;
    const { proposalId } = await submittedWithFile(people);
    await adds(odo, people, proposalId, { bytes: sampleCsv(), name: "runs.csv", beside: true });
    await adds(odo, people, proposalId, { bytes: sampleCsv(), name: "runs.csv", beside: true });

    const concerned = [tansy, ines, elske, lusia, fenno].map(({ userId }) => userId);
    expect(await told("evidence_added")).toEqual(concerned.sort((one, other) => one - other));
  });
});

describe("the files on the disk", () => {
  it("are read whole: one that was altered or is gone is named", async () => {
    const people = await team();
    const { proposalId, file } = await submittedWithFile(people);
    const beside = await adds(people.odo, people, proposalId, { bytes: sampleCsv(), name: "runs.csv", beside: true });
    expect(await inSnapshot(verifyFiles)).toEqual({ files: 2, faults: [] });

    chmodSync(placeOf(file.sha256), 0o600);
    writeFileSync(placeOf(file.sha256), "%PDF-1.4 another");
    rmSync(placeOf(beside.sha256));
    const { faults } = await inSnapshot(verifyFiles);
    expect(faults).toEqual([
      {
        file: `record 12.pdf (${file.sha256.slice(0, 12)})`,
        sentence: expect.stringMatching(/^Its content gives [0-9a-f]{12}: it is not the file that was added\.$/),
      },
      { file: `runs.csv (${beside.sha256.slice(0, 12)})`, sentence: "It is not where it was kept." },
    ]);
  });
});

import { beforeEach, describe, expect, it, vi } from "vitest";
import { POST } from "@/app/api/products/[productCode]/files/route";
import { GET } from "@/app/api/products/[productCode]/files/[fileId]/route";
import { isDownload } from "@/app/_server/security-headers";
import { voidFile } from "@/lib/proposals/files/void-file";
import type { Actor } from "@/lib/vocabulary/actor";
import { LONGEST_FILE } from "@/lib/vocabulary/files";
import { Attachment } from "@/models/attachment";
import { Looking } from "@/models/looking";
import { config } from "@/proxy";
import { withDatabase } from "@/tests/support/database";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import { samplePdf } from "@/tests/support/sample-files";
import { draft, onDisk, submittedWithFile } from "@/tests/lib/proposals/file-cycle";
import { CODE, team, type Team } from "@/tests/lib/proposals/review-cycle";

withDatabase();

let signedIn: Actor | null = null;
vi.mock("@/app/_server/session", () => ({ currentActor: () => Promise.resolve(signedIn) }));
beforeEach(() => {
  signedIn = null;
});

const ADDRESS = "http://127.0.0.1:3000";

function upload(
  proposalId: number,
  body: Buffer | ReadableStream,
  headers: Record<string, string> = {},
  date = "2026-02-10",
) {
  const query = `proposal=${proposalId}&place=working_copy&name=record.pdf&sourceDate=${date}`;
  const address = `${ADDRESS}/api/products/${CODE}/files?${query}`;
  const sent = Buffer.isBuffer(body) ? new Uint8Array(body) : body;
  const init: RequestInit & { duplex: "half" } = { method: "POST", body: sent, headers, duplex: "half" };
  return POST(new Request(address, init), { params: Promise.resolve({ productCode: CODE }) });
}

function download(fileId: number | string, headers: Record<string, string> = {}) {
  const request = new Request(`${ADDRESS}/api/products/${CODE}/files/${fileId}`, { headers });
  return GET(request, { params: Promise.resolve({ productCode: CODE, fileId: String(fileId) }) });
}

async function tansysDraft(): Promise<Team & { proposalId: number }> {
  const people = await team();
  signedIn = people.tansy;
  return { ...people, proposalId: await draft(people.tansy, people) };
}

async function nothingKept() {
  expect(await Attachment.count()).toBe(0);
  expect(onDisk()).toEqual([]);
}

describe("sending a file", () => {
  it("is answered with what was kept, under the headers that every answer carries", async () => {
    const { proposalId } = await tansysDraft();
    const response = await upload(proposalId, samplePdf());
    expect(response.status).toBe(200);
    expect(await response.json()).toMatchObject({ outcome: "added", name: "record.pdf" });
    expect(response.headers.get("x-content-type-options")).toBe("nosniff");
    expect(response.headers.get("content-security-policy")).toContain("default-src 'none'");
    expect(await invariantFaults()).toEqual([]);
  });

  it("is refused from another site, signed out, without a date, or as nothing", async () => {
    const { proposalId, tansy } = await tansysDraft();
    const host = { host: "127.0.0.1:3000" };
    expect((await upload(proposalId, samplePdf(), { ...host, origin: "https://elsewhere.example" })).status).toBe(403);
    expect((await upload(proposalId, samplePdf(), { "sec-fetch-site": "cross-site" })).status).toBe(403);
    const undated = await upload(proposalId, samplePdf(), {}, "");
    expect(await undated.json()).toMatchObject({ faults: [{ path: "sourceDate" }] });
    signedIn = null;
    expect((await upload(proposalId, samplePdf())).status).toBe(401);
    signedIn = tansy;
    const empty = await upload(proposalId, Buffer.alloc(0));
    expect(await empty.json()).toMatchObject({ code: "invalid", sentence: "This file is empty." });
    await nothingKept();
  });

  it("is refused with 413 in words by the length it states, and by the bytes that come where it states less", async () => {
    const { proposalId } = await tansysDraft();
    const stated = await upload(proposalId, samplePdf(), { "content-length": String(LONGEST_FILE + 1) });
    expect(stated.status).toBe(413);
    expect(await stated.json()).toMatchObject({ code: "too_large", sentence: expect.stringContaining("25 MB") });

    const part = Buffer.alloc(1_000_000, "0123456789\n");
    let parts = 0;
    const endless = new ReadableStream({
      pull(controller) {
        parts += 1;
        controller.enqueue(part);
      },
    });
    expect((await upload(proposalId, endless, { "content-length": "1000" })).status).toBe(413);
    expect(parts).toBeLessThan(30);
    await nothingKept();
  });

  it("keeps nothing of what its sender broke off", async () => {
    const { proposalId } = await tansysDraft();
    const broken = new ReadableStream({
      start(controller) {
        controller.enqueue(samplePdf().subarray(0, 60));
      },
      pull(controller) {
        controller.error(new Error("The connection is gone."));
      },
    });
    await expect(upload(proposalId, broken)).rejects.toThrow("The connection is gone.");
    await nothingKept();
    expect(await invariantFaults()).toEqual([]);
  });

  it("is the one request that the proxy does not hold up, and reading the one that it shuts in", () => {
    const passes = (path: string) => new RegExp(`^${config.matcher[0]}$`).test(path);
    expect(passes(`/api/products/${CODE}/files`)).toBe(false);
    for (const path of [`/api/products/${CODE}/files/12`, `/api/products/${CODE}/drafts/12`, "/products/files", "/"]) {
      expect(passes(path)).toBe(true);
    }
    expect(isDownload(`/api/products/${CODE}/files/12`)).toBe(true);
    expect(isDownload(`/api/products/${CODE}/history`)).toBe(false);
  });
});

describe("downloading a file", () => {
  const seen = async () => (await Looking.findAll({ where: { kind: "file" } })).map(({ subject }) => subject).sort();

  it("gives back every byte, to be saved and never shown in place", async () => {
    const people = await team();
    const bytes = samplePdf("Grüße");
    const { file } = await submittedWithFile(people, bytes);
    signedIn = people.maud;
    const response = await download(file.fileId);
    expect(Buffer.from(await response.arrayBuffer()).equals(bytes)).toBe(true);
    expect(Object.fromEntries(response.headers)).toMatchObject({
      "content-type": "application/pdf",
      "content-length": String(bytes.length),
      "content-disposition": `attachment; filename="record 12.pdf"; filename*=UTF-8''record%2012.pdf`,
      "x-content-type-options": "nosniff",
      "content-security-policy": expect.stringMatching(/^sandbox; default-src 'none'/),
      "cache-control": "private, no-store",
    });
  });

  it("is noted once for the person and the round, when the last byte went and a page of ours asked", async () => {
    const people = await team();
    const { file } = await submittedWithFile(people);
    signedIn = people.ines;
    const untouched = await download(file.fileId);
    await untouched.body?.cancel();
    await (await download(file.fileId, { "sec-fetch-site": "cross-site" })).arrayBuffer();
    expect(await seen()).toEqual([]);

    for (const site of ["same-origin", "none"]) {
      await (await download(file.fileId, { "sec-fetch-site": site })).arrayBuffer();
    }
    expect(await seen()).toEqual([`file ${file.fileId}`, expect.stringMatching(`^round \\d+ file ${file.fileId}$`)]);
  });

  it("still reads a voided one, which says so in its name", async () => {
    const people = await team();
    const { file } = await submittedWithFile(people);
    await voidFile(people.tansy, { fileId: file.fileId, reason: "Another part." }, people.clock);
    signedIn = people.ines;
    const response = await download(file.fileId);
    expect(response.headers.get("content-disposition")).toContain('filename="VOIDED record 12.pdf"');
    expect(response.status).toBe(200);
  });

  it("is refused signed out, without a role, and where there is none", async () => {
    const people = await team();
    const { file } = await submittedWithFile(people);
    expect((await download(file.fileId)).status).toBe(401);
    signedIn = { ...people.maud, memberships: [] };
    expect((await download(file.fileId)).status).toBe(403);
    signedIn = people.maud;
    for (const id of [file.fileId + 1, "0", "1e3", "..%2f..%2fleeboard.sqlite"]) {
      expect((await download(id)).status).toBe(404);
    }
  });
});

import { createHash } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { downloadName } from "@/lib/evidence/download-name";
import { incomingFolder } from "@/lib/evidence/file-places";
import { receiveFile, type ReceivedFile } from "@/lib/evidence/receive-file";
import { LONGEST_FILE } from "@/lib/vocabulary/files";
import { withDatabase } from "@/tests/support/database";
import {
  inPieces,
  sampleCsv,
  sampleJpeg,
  samplePdf,
  samplePng,
  sampleText,
  sampleXlsx,
  sampleZip,
} from "@/tests/support/sample-files";

withDatabase();

const XLSX = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";

async function typeOf(bytes: Uint8Array): Promise<string> {
  return receiveFile(inPieces(bytes), async ({ type }) => type);
}

const left = () => readdirSync(incomingFolder());

describe("receiving a file", () => {
  it.each<[string, Buffer, string]>([
    ["a PDF", samplePdf(), "application/pdf"],
    ["a PNG", samplePng(), "image/png"],
    ["a JPEG", sampleJpeg(), "image/jpeg"],
    ["a workbook", sampleXlsx(), XLSX],
    ["a table with commas", sampleCsv(), "text/csv"],
    ["a table with semicolons and a quoted comma", Buffer.from('a;b\n"1;2";3\n'), "text/csv"],
    ["a text", sampleText(), "text/plain"],
    ["a text with a byte order mark and Windows line ends", Buffer.from("\ufeffone\r\ntwo\r\n"), "text/plain"],
    ["a page of a browser, which is text here", Buffer.from("<script>alert(1)</script>"), "text/plain"],
  ])("tells %s by its content", async (_, bytes, type) => {
    expect(await typeOf(bytes)).toBe(type);
    expect(left()).toEqual([]);
  });

  it.each<[string, Buffer, RegExp]>([
    ["nothing at all", Buffer.alloc(0), /empty/],
    ["a PDF that breaks off", samplePdf().subarray(0, 200), /breaks off/],
    ["a PNG that breaks off", samplePng().subarray(0, -8), /breaks off/],
    ["another archive", sampleZip(["mimetype", "content.xml"]), /no XLSX workbook/],
    [
      "a workbook with macros",
      sampleZip(["[Content_Types].xml", "xl/workbook.xml", "xl/vbaProject.bin"]),
      /without macros/,
    ],
    ["an archive with a broken directory", Buffer.from("PK\u0003\u0004 and no more", "latin1"), /no XLSX workbook/],
    ["a program", Buffer.from([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0]), /none of the kinds/],
    ["text in another encoding", Buffer.from("Gr\xfc\xdfe", "latin1"), /none of the kinds/],
    ["text cut within a character", Buffer.from("µm").subarray(0, 1), /none of the kinds/],
    ["text with a NUL", Buffer.from("a\0b"), /none of the kinds/],
  ])("refuses %s and keeps nothing", async (_, bytes, sentence) => {
    await expect(typeOf(bytes)).rejects.toMatchObject({ code: "invalid", message: expect.stringMatching(sentence) });
    expect(left()).toEqual([]);
  });

  it("hashes and counts what came, whatever the pieces", async () => {
    const bytes = samplePdf();
    const seen = await receiveFile(inPieces(bytes, 13), async (file: ReceivedFile) => {
      return { ...file, kept: readFileSync(file.temporary) };
    });
    expect(seen.kept.equals(bytes)).toBe(true);
    expect(seen.size).toBe(bytes.length);
    expect(seen.sha256).toBe(createHash("sha256").update(bytes).digest("hex"));
  });

  it("takes 25 MB to the byte and stops reading at the first byte more", async () => {
    const line = Buffer.alloc(1_000_000, "0123456789\n");
    let given = 0;
    async function* endless(total: number) {
      while (given < total) {
        const part = line.subarray(0, Math.min(line.length, total - given));
        given += part.length;
        yield part;
      }
    }
    expect(await receiveFile(endless(LONGEST_FILE), async ({ size }) => size)).toBe(LONGEST_FILE);

    given = 0;
    await expect(receiveFile(endless(10 * LONGEST_FILE), async () => "kept")).rejects.toMatchObject({
      code: "too_large",
    });
    expect(given).toBeLessThan(LONGEST_FILE + 2 * line.length);
    expect(left()).toEqual([]);
  });

  it("keeps nothing of a stream that breaks", async () => {
    async function* broken() {
      yield samplePdf().subarray(0, 100);
      throw new Error("aborted");
    }
    await expect(receiveFile(broken(), async () => "kept")).rejects.toThrow("aborted");
    expect(left()).toEqual([]);
  });
});

describe("the name under which a file is saved", () => {
  const named = (name: string, mediaType: string, voidedAt: string | null = null) =>
    downloadName({ name, mediaType, voidedAt });

  it("ends as its content asks, whatever it was called", () => {
    expect(named("photo.png", "application/pdf").plain).toBe("photo.png.pdf");
    expect(named("report.PDF", "application/pdf").plain).toBe("report.PDF");
    expect(named("run.sh", "text/plain").plain).toBe("run.sh.txt");
  });

  it("can break out of no header and keeps every letter in its encoded form (RFC 8187)", () => {
    const { plain, encoded } = named('Prüf"bericht\r\n*.pdf', "application/pdf");
    expect(plain).toBe("Pr_f_bericht___.pdf");
    expect(encoded).toBe("Pr%C3%BCf%22bericht%0D%0A%2A.pdf");
  });

  it("says of a voided file that it is", () => {
    expect(named("a.pdf", "application/pdf", "2026-05-01T00:00:00.000Z").encoded).toBe("VOIDED%20a.pdf");
  });
});

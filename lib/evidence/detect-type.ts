import type { FileType } from "@/lib/vocabulary/files";
import { isXlsx, NOT_A_WORKBOOK } from "./zip-directory";

/** The beginning and the end of a file, and whether the whole of it read as text. */
export interface FileTraits {
  head: Buffer;
  tail: Buffer;
  isText: boolean;
}

/** How much of either end is looked at: a ZIP directory may stand as far as this before the end. */
export const END_LENGTH = 65_557 + 65_536;

export type Detected = { ok: true; type: FileType } | { ok: false; sentence: string };

const PNG_HEAD = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52]);
const PNG_END = Buffer.from([0x49, 0x45, 0x4e, 0x44, 0xae, 0x42, 0x60, 0x82]);
const JPEG_HEAD = Buffer.from([0xff, 0xd8, 0xff]);
const JPEG_END = Buffer.from([0xff, 0xd9]);
const ZIP_HEAD = Buffer.from("PK\u0003\u0004", "latin1");

const UNKNOWN = "This is none of the kinds that can be kept: PDF, PNG, JPEG, CSV, XLSX or plain text (UTF-8).";

/** The kind of a file by its content alone: what its name says is not asked. */
export function detectType({ head, tail, isText }: FileTraits): Detected {
  if (head.length === 0) return { ok: false, sentence: "This file is empty." };
  if (/^%PDF-[12]\.\d/.test(head.toString("latin1", 0, 8))) {
    return whole("application/pdf", tail.subarray(-1024).includes("%%EOF"));
  }
  if (startsWith(head, PNG_HEAD)) return whole("image/png", tail.includes(PNG_END));
  if (startsWith(head, JPEG_HEAD)) return whole("image/jpeg", tail.includes(JPEG_END));
  if (startsWith(head, ZIP_HEAD)) {
    return isXlsx(tail)
      ? { ok: true, type: "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet" }
      : { ok: false, sentence: NOT_A_WORKBOOK };
  }
  return isText ? { ok: true, type: isTable(head) ? "text/csv" : "text/plain" } : { ok: false, sentence: UNKNOWN };
}

function whole(type: FileType, hasEnd: boolean): Detected {
  return hasEnd ? { ok: true, type } : { ok: false, sentence: "This file breaks off before its end. Send it again." };
}

function startsWith(head: Buffer, mark: Buffer): boolean {
  return head.subarray(0, mark.length).equals(mark);
}

/** A table has the same number of separators, at least one, in every row that the beginning shows whole. */
function isTable(head: Buffer): boolean {
  const rows = head
    .toString("utf8")
    .replace(/"[^"]*"/g, "")
    .split(/\r?\n/)
    .slice(0, head.length < END_LENGTH ? undefined : -1)
    .filter((row) => row.trim() !== "");
  if (rows.length < 2) return false;
  return [",", ";", "\t"].some((separator) => {
    const counts = new Set(rows.map((row) => row.split(separator).length));
    return counts.size === 1 && !counts.has(1);
  });
}

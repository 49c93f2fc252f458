import { createHash, randomUUID } from "node:crypto";
import { mkdir, open, rm, type FileHandle } from "node:fs/promises";
import path from "node:path";
import { LONGEST_FILE, type FileType } from "@/lib/vocabulary/files";
import { Refusal } from "@/lib/vocabulary/refusal";
import { detectType, END_LENGTH } from "./detect-type";
import { incomingFolder } from "./file-places";
import { TextCheck } from "./text-check";

/** A file that arrived whole and waits to be kept. */
export interface ReceivedFile {
  temporary: string;
  size: number;
  sha256: string;
  type: FileType;
}

/**
 * Takes a file from a stream, counted and hashed as it comes, and hands it to the work; whatever the work left of it
 * is removed, as is everything of a stream that broke, was too long or is of no kind that can be kept.
 */
export async function receiveFile<T>(
  content: AsyncIterable<Uint8Array>,
  work: (file: ReceivedFile) => Promise<T>,
): Promise<T> {
  await mkdir(incomingFolder(), { recursive: true });
  const temporary = path.join(incomingFolder(), randomUUID());
  try {
    return await work({ temporary, ...(await written(temporary, content)) });
  } finally {
    await rm(temporary, { force: true });
  }
}

async function written(temporary: string, content: AsyncIterable<Uint8Array>) {
  const file = await open(temporary, "wx+");
  try {
    const hash = createHash("sha256");
    const text = new TextCheck();
    let size = 0;
    for await (const bytes of content) {
      size += bytes.length;
      if (size > LONGEST_FILE) throw tooLarge();
      hash.update(bytes);
      text.add(bytes);
      await writeAll(file, bytes);
    }
    await file.sync();
    const detected = detectType({ ...(await endsOf(file, size)), isText: text.isText() });
    if (!detected.ok) throw new Refusal("invalid", detected.sentence, [{ path: "file", sentence: detected.sentence }]);
    return { size, sha256: hash.digest("hex"), type: detected.type };
  } finally {
    await file.close();
  }
}

export function tooLarge(): Refusal {
  const sentence = "This file is larger than 25 MB. Send an extract, or one file for each part.";
  return new Refusal("too_large", sentence, [{ path: "file", sentence }]);
}

async function writeAll(file: FileHandle, bytes: Uint8Array): Promise<void> {
  let done = 0;
  while (done < bytes.length) done += (await file.write(bytes, done)).bytesWritten;
}

async function endsOf(file: FileHandle, size: number): Promise<{ head: Buffer; tail: Buffer }> {
  const length = Math.min(size, END_LENGTH);
  return { head: await part(file, 0, length), tail: await part(file, size - length, length) };
}

async function part(file: FileHandle, from: number, length: number): Promise<Buffer> {
  const bytes = Buffer.alloc(length);
  let done = 0;
  while (done < length) {
    const { bytesRead } = await file.read(bytes, done, length - done, from + done);
    if (bytesRead === 0) break;
    done += bytesRead;
  }
  return bytes.subarray(0, done);
}

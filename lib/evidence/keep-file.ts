import { createHash } from "node:crypto";
import { createReadStream } from "node:fs";
import { link, mkdir, readdir, rm } from "node:fs/promises";
import path from "node:path";
import { pipeline } from "node:stream/promises";
import { Attachment } from "@/models/attachment";
import { inTransaction } from "@/models/database";
import { incomingFolder, placeOf } from "./file-places";
import type { ReceivedFile } from "./receive-file";

/**
 * Gives a received file its place, as the last step of the transaction that writes its row. Writers go one after
 * another, so that no clean-up sees the file before its row. The temporary name goes only after the commit: what a
 * stopped server leaves in between is known by it.
 */
export async function keepFile({ temporary, sha256 }: ReceivedFile): Promise<void> {
  await mkdir(path.dirname(placeOf(sha256)), { recursive: true });
  await link(temporary, placeOf(sha256)).catch((problem: unknown) => {
    // The same content came before, by another row.
    if (codeOf(problem) !== "EEXIST") throw problem;
  });
}

/** Removes a file that no row names, after a transaction that failed; in the queue of the writers, as above. */
export function discardUnheld(sha256: string): Promise<void> {
  return inTransaction(async (tx) => {
    if ((await Attachment.count({ where: { sha256 }, transaction: tx })) > 0) return;
    await rm(placeOf(sha256), { force: true });
  });
}

/** Removes what a server that stopped in the middle of an upload left; before the next one takes requests. */
export async function sweepIncoming(): Promise<number> {
  const left = await readdir(incomingFolder()).catch((problem: unknown) => {
    if (codeOf(problem) === "ENOENT") return [];
    throw problem;
  });
  for (const name of left) {
    const file = path.join(incomingFolder(), name);
    await discardUnheld(await hashOf(file));
    await rm(file, { force: true });
  }
  return left.length;
}

export async function hashOf(file: string): Promise<string> {
  const hash = createHash("sha256");
  await pipeline(createReadStream(file), hash);
  return hash.digest("hex");
}

function codeOf(problem: unknown): unknown {
  return problem instanceof Error && "code" in problem ? problem.code : undefined;
}

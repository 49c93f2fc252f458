import type { Transaction } from "sequelize";
import { placeOf } from "@/lib/evidence/file-places";
import { productByCode } from "@/lib/budget/load-budget";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inSnapshot, inTransaction } from "@/models/database";
import { authorize } from "@/policies/authorize";
import { citedInRounds } from "../records/cited-files";
import { readableFiles, type FileRecord } from "../records/file-records";
import { fileSubject, noteLooking } from "../records/note-looking";
import { proposalById } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { noSuchFile } from "./void-file";

/** What a download needs: the file's row, and where its content stands. */
export interface OpenedFile {
  file: FileRecord;
  path: string;
}

/** A file for a member who may read it. @throws Refusal */
export function fileToOpen(actor: Actor, productCode: string, fileId: number): Promise<OpenedFile> {
  return inSnapshot(async (tx) => {
    const product = await productByCode(productCode, tx);
    authorize(actor, { on: "Product", action: "read_budget", productId: product.id });
    const file = (await readableFiles(actor, product.id, tx)).find(({ id }) => id === fileId);
    if (!file) throw noSuchFile();
    return { file, path: placeOf(file.sha256) };
  });
}

/** Remembers a download that went through: once for the person and the file, and for each round that is open on it. */
export function noteOpening(actor: Actor, file: FileRecord, clock: Clock = systemClock): Promise<void> {
  return inTransaction(async (tx) => {
    const at = clock().toISOString();
    const looked = { userId: actor.userId, kind: "file" as const };
    await noteLooking({ ...looked, subject: `file ${file.id}` }, at, tx);
    for (const roundId of await openRounds(file, tx)) {
      await noteLooking({ ...looked, subject: fileSubject(roundId, file.id) }, at, tx);
    }
  });
}

async function openRounds(file: FileRecord, tx: Transaction): Promise<number[]> {
  const citing = (await citedInRounds(file.productId, tx)).filter(
    ({ sha256, isCurrent }) => isCurrent && sha256 === file.sha256,
  );
  const beside = file.place === "proposal" ? await currentRound(file.proposalId, tx) : [];
  return [...new Set([...citing.map(({ roundId }) => roundId), ...beside])];
}

async function currentRound(proposalId: number, tx: Transaction): Promise<number[]> {
  const { state, round } = await proposalById(proposalId, tx);
  const current = state === "proposed" ? await roundOf(proposalId, round, tx) : null;
  return current ? [current.id] : [];
}

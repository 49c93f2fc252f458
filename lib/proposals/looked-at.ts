import { Op, type Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inTransaction } from "@/models/database";
import { Looking } from "@/models/looking";
import { noteLooking } from "./note-looking";

const ROUND = "round";
const SHEET = "signing text";

interface Looked {
  /** The round that the page showed; null for a draft. */
  roundId: number | null;
  /** Hash of the text to be signed, where the reader was offered it. */
  textHash: string | null;
}

/** Remembers that a person opened a round, and the very text that they could sign. */
export function noteLooked(actor: Actor, { roundId, textHash }: Looked, clock: Clock = systemClock): Promise<void> {
  return inTransaction(async (tx) => {
    const at = clock().toISOString();
    if (roundId !== null) await noteLooking({ userId: actor.userId, kind: ROUND, subject: String(roundId) }, at, tx);
    if (textHash !== null) await noteLooking({ userId: actor.userId, kind: SHEET, subject: textHash }, at, tx);
  });
}

/** Which of these texts a person has opened. The hash says of what round, with what effect and what routing. */
export async function openedTexts(
  userId: number,
  textHashes: readonly string[],
  tx: Transaction,
): Promise<ReadonlySet<string>> {
  const where = { userId, kind: SHEET, subject: { [Op.in]: [...textHashes] } };
  const rows = await Looking.findAll({ where, transaction: tx });
  return new Set(rows.map(({ subject }) => subject));
}

/** When a person last opened each of these rounds. */
export async function roundsLookedAt(
  userId: number,
  roundIds: readonly number[],
  tx: Transaction,
): Promise<ReadonlyMap<number, string>> {
  const where = { userId, kind: ROUND, subject: { [Op.in]: roundIds.map(String) } };
  const rows = await Looking.findAll({ where, transaction: tx });
  return new Map(rows.map(({ subject, lastAt }) => [Number(subject), lastAt]));
}

import { Op, type Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inTransaction } from "@/models/database";
import { Looking } from "@/models/looking";
import { noteLooking } from "./note-looking";

const SHEET = "signing text" as const;

/** Remembers that a person opened a sheet with the very text that can be signed now. */
export function noteOpened(actor: Actor, textHash: string, clock: Clock = systemClock): Promise<void> {
  const opened = { userId: actor.userId, kind: SHEET, subject: textHash };
  return inTransaction((tx) => noteLooking(opened, clock().toISOString(), tx));
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

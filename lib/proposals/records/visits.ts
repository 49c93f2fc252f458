import type { Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inTransaction } from "@/models/database";
import { Looking } from "@/models/looking";

const KIND = "day sheet";
const PAUSE = 30 * 60_000;

/** When the person last looked at their day sheet before the present visit; null on the first one. */
export async function previousVisit(userId: number, tx: Transaction): Promise<string | null> {
  const row = await Looking.findOne({ where: { userId, kind: KIND, subject: "previous visit" }, transaction: tx });
  return row?.lastAt ?? null;
}

/** Remembers that the day sheet was opened. After half an hour's pause a new visit begins. */
export function noteVisit(actor: Actor, clock: Clock = systemClock): Promise<void> {
  return inTransaction(async (tx) => {
    const at = clock().toISOString();
    const where = { userId: actor.userId, kind: KIND };
    const present = await Looking.findOne({ where: { ...where, subject: "present visit" }, transaction: tx });
    if (!present) {
      await Looking.create({ ...where, subject: "present visit", firstAt: at, lastAt: at }, { transaction: tx });
      return;
    }
    if (Date.parse(at) - Date.parse(present.lastAt) > PAUSE) await keepPrevious(where, present.lastAt, tx);
    await present.update({ lastAt: at }, { transaction: tx });
  });
}

async function keepPrevious(where: { userId: number; kind: string }, lastAt: string, tx: Transaction): Promise<void> {
  const subject = "previous visit";
  const row = await Looking.findOne({ where: { ...where, subject }, transaction: tx });
  if (row) await row.update({ lastAt }, { transaction: tx });
  else await Looking.create({ ...where, subject, firstAt: lastAt, lastAt }, { transaction: tx });
}

import { Op, type Transaction } from "sequelize";
import { Looking } from "@/models/looking";

export type LookingKind = "file" | "line history" | "signing text";

interface Looked {
  userId: number;
  kind: LookingKind;
  subject: string;
}

/** Remembers that a person opened something, the first and the last time. */
export async function noteLooking({ userId, kind, subject }: Looked, at: string, tx: Transaction): Promise<void> {
  const known = await Looking.findOne({ where: { userId, kind, subject }, transaction: tx });
  if (known) await known.update({ lastAt: at }, { transaction: tx });
  else await Looking.create({ userId, kind, subject, firstAt: at, lastAt: at }, { transaction: tx });
}

/** What was opened of the subjects and by whom, each with its first time. */
export async function lookingsAt(
  kind: LookingKind,
  subjects: readonly string[],
  tx: Transaction,
): Promise<{ userId: number; subject: string; firstAt: string }[]> {
  if (subjects.length === 0) return [];
  const rows = await Looking.findAll({ where: { kind, subject: { [Op.in]: [...subjects] } }, transaction: tx });
  return rows.map(({ userId, subject, firstAt }) => ({ userId, subject, firstAt }));
}

/** A file counts as opened for each round it is cited by, or stands beside, while that round is open to signers. */
export const fileSubject = (roundId: number, fileId: number) => `round ${roundId} file ${fileId}`;

export const historySubject = (roundId: number, kind: string, number: string) => `round ${roundId} ${kind} ${number}`;

import { Op, QueryTypes, type Transaction } from "sequelize";
import { HOUSE_CHAIN, type Act, type ActSubject } from "@/lib/vocabulary/acts";
import type { Clock } from "@/lib/vocabulary/clock";
import type { Refusal } from "@/lib/vocabulary/refusal";
import { database, inTransaction } from "@/models/database";
import { HistoryEntry } from "@/models/history-entry";
import { Product } from "@/models/product";
import { writeEntry, type ActingPerson } from "./write-entry";

/** More refusals of one person in a minute are counted, not written: nobody can flood the history. */
export const REFUSALS_A_MINUTE = 30;

const MINUTE = 60_000;

interface RefusedAct {
  act: Act;
  chain: string;
  subject?: ActSubject;
}

/** Writes down an act that was refused. The count of those left out since stands in the next one. */
export function recordRefusal(
  person: ActingPerson,
  clock: Clock,
  { act, chain, subject }: RefusedAct,
  refusal: Refusal,
): Promise<void> {
  return inTransaction(async (tx) => {
    const moment = clock();
    if ((await refusedSince(person, new Date(moment.getTime() - MINUTE), tx)) >= REFUSALS_A_MINUTE) {
      await countDropped(person, tx);
      return;
    }
    const known = await knownChain(chain, tx);
    const dropped = await takeDropped(person, tx);
    await writeEntry(
      person,
      {
        act,
        chain: known,
        at: moment.toISOString(),
        subject: subject ?? { type: known === HOUSE_CHAIN ? "house" : "product", id: known, label: known },
        now: dropped > 0 ? { refusal: refusal.code, leftOutBefore: dropped } : { refusal: refusal.code },
        reason: refusal.message,
        outcome: "refused",
        records: [],
      },
      tx,
    );
  });
}

function refusedSince(person: ActingPerson, since: Date, tx: Transaction): Promise<number> {
  return HistoryEntry.count({
    where: { personId: person.userId, outcome: "refused", at: { [Op.gt]: since.toISOString() } },
    transaction: tx,
  });
}

/** A product that does not exist (yet) has no chain. */
async function knownChain(chain: string, tx: Transaction): Promise<string> {
  const known = await Product.count({ where: { code: chain }, transaction: tx });
  return known > 0 ? chain : HOUSE_CHAIN;
}

/** Nobody known is counted under 0, which is no person's id. */
function counterKey(person: ActingPerson): number {
  return person.userId ?? 0;
}

async function countDropped(person: ActingPerson, tx: Transaction): Promise<void> {
  await database.query(
    `INSERT INTO dropped_refusals (user_id, count) VALUES (:key, 1)
      ON CONFLICT (user_id) DO UPDATE SET count = count + 1`,
    { transaction: tx, replacements: { key: counterKey(person) } },
  );
}

async function takeDropped(person: ActingPerson, tx: Transaction): Promise<number> {
  const [row] = await database.query<{ count: number }>("SELECT count FROM dropped_refusals WHERE user_id = :key", {
    type: QueryTypes.SELECT,
    transaction: tx,
    replacements: { key: counterKey(person) },
  });
  if (!row || row.count === 0) return 0;
  await database.query("UPDATE dropped_refusals SET count = 0 WHERE user_id = :key", {
    transaction: tx,
    replacements: { key: counterKey(person) },
  });
  return row.count;
}

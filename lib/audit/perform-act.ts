import { QueryTypes, type Transaction } from "sequelize";
import type { Act, ActRecord, ActSubject, RecordAct } from "@/lib/vocabulary/acts";
import type { Clock } from "@/lib/vocabulary/clock";
import { RECORDED_REFUSALS, Refusal } from "@/lib/vocabulary/refusal";
import { database, inTransaction } from "@/models/database";
import { newestRecordIds, recordsSince } from "./bound-records";
import { recordRefusal } from "./record-refusal";
import { writeEntry, type ActingPerson } from "./write-entry";

export interface ActFrame {
  act: Act;
  /** A product's code, or the house chain. */
  chain: string;
  /** What a refusal names; without it the product or the house. */
  subject?: ActSubject;
}

export type ActWork<T> = (tx: Transaction, record: RecordAct, at: string) => Promise<T>;

/**
 * The one way to change anything that stands in the history: one transaction with its entries and mails.
 * Work that wrote something and recorded nothing is a bug and leaves nothing. A refusal about right, state or
 * independence is written down after the roll-back, in a transaction of its own, and thrown on.
 */
export async function performAct<T>(actor: ActingPerson, clock: Clock, frame: ActFrame, work: ActWork<T>): Promise<T> {
  try {
    return await inTransaction((tx) => runAct(actor, clock, frame, work, tx));
  } catch (problem) {
    if (problem instanceof Refusal && RECORDED_REFUSALS.includes(problem.code)) {
      await recordRefusal(actor, clock, frame, problem);
    }
    throw problem;
  }
}

async function runAct<T>(actor: ActingPerson, clock: Clock, frame: ActFrame, work: ActWork<T>, tx: Transaction) {
  // Taken inside the queue, so that times grow along a chain.
  const at = clock().toISOString();
  const before = await newestRecordIds(tx);
  const newestMail = await newestOutboxId(tx);
  const acts: ActRecord[] = [];

  const result = await work(tx, (record) => void acts.push(record), at);

  if (acts.length === 0) {
    if ((await changedRows(tx)) > 0) throw new Error(`The act ${frame.act} changed rows and recorded nothing.`);
    return result;
  }
  const records = await recordsSince(before, tx);
  const entryIds: number[] = [];
  for (const [index, act] of acts.entries()) {
    const content = { ...act, chain: frame.chain, at, outcome: "done" as const, records: index === 0 ? records : [] };
    entryIds.push(await writeEntry(actor, content, tx));
  }
  await database.query("UPDATE outbox_messages SET entry_id = :entry WHERE id > :newest", {
    transaction: tx,
    replacements: { entry: entryIds[0], newest: newestMail },
  });
  return result;
}

async function newestOutboxId(tx: Transaction): Promise<number> {
  const [row] = await database.query<{ id: number }>("SELECT coalesce(max(id), 0) AS id FROM outbox_messages", {
    type: QueryTypes.SELECT,
    transaction: tx,
  });
  return row?.id ?? 0;
}

/** Rows written on this connection, which the transaction has for itself. */
async function changedRows(tx: Transaction): Promise<number> {
  const [row] = await database.query<{ changed: number }>("SELECT total_changes() AS changed", {
    type: QueryTypes.SELECT,
    transaction: tx,
  });
  return row?.changed ?? 0;
}

import type { Transaction } from "sequelize";
import type { ActRecord, Outcome } from "@/lib/vocabulary/acts";
import { HistoryEntry } from "@/models/history-entry";
import type { BoundRecord } from "./bound-records";
import { canonicalJson } from "./canonical-json";
import { entryHash, GENESIS_HASH } from "./entry-hash";

/** Who stands on an entry: an actor, or nobody known (a sign-in under an unknown address). */
export interface ActingPerson {
  userId: number | null;
  printedName: string;
}

export interface EntryContent extends ActRecord {
  chain: string;
  at: string;
  outcome: Outcome;
  /** The rows that the act wrote. */
  records: readonly BoundRecord[];
}

export interface ChainHeadValue {
  sequence: number;
  hash: string;
}

/** Where the chain ends now; an empty chain ends at the genesis hash. */
export async function chainHead(chain: string, tx: Transaction | null = null): Promise<ChainHeadValue> {
  const last = await HistoryEntry.findOne({ where: { chain }, order: [["sequence", "DESC"]], transaction: tx });
  return last ? { sequence: last.sequence, hash: last.hash } : { sequence: 0, hash: GENESIS_HASH };
}

/** Adds one entry at the end of its chain; answers its row's id. */
export async function writeEntry(person: ActingPerson, content: EntryContent, tx: Transaction): Promise<number> {
  const head = await chainHead(content.chain, tx);
  const sequence = head.sequence + 1;
  const canonicalText = entryText(person, content, sequence);
  const { chain, at, capacity, act, subject, was, now, reason, outcome } = content;
  const entry = await HistoryEntry.create(
    {
      chain,
      sequence,
      at,
      personId: person.userId,
      printedName: person.printedName,
      capacity: capacity ?? null,
      act,
      subjectType: subject.type,
      subjectId: subject.id,
      subjectLabel: subject.label,
      was: was === undefined ? null : canonicalJson(was),
      now: now === undefined ? null : canonicalJson(now),
      reason: reason ?? null,
      outcome,
      canonicalText,
      previousHash: head.hash,
      hash: entryHash(head.hash, canonicalText),
    },
    { transaction: tx },
  );
  return entry.id;
}

function entryText(person: ActingPerson, content: EntryContent, sequence: number): string {
  const { chain, at, capacity, act, subject, was, now, reason, outcome, records } = content;
  return canonicalJson({
    chain,
    sequence,
    at,
    person: { id: person.userId, name: person.printedName },
    capacity: capacity ?? null,
    act,
    subject: { type: subject.type, id: subject.id, label: subject.label },
    was: was ?? null,
    now: now ?? null,
    reason: reason ?? null,
    outcome,
    records,
  });
}

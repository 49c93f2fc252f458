import { Op, type Transaction } from "sequelize";
import { z } from "zod";
import { HistoryEntry } from "@/models/history-entry";
import type { BoundRecord } from "./bound-records";
import { canonicalJson } from "./canonical-json";
import { chainFault, type ChainFault } from "./chain-report";
import { entryHash, GENESIS_HASH } from "./entry-hash";
import type { ChainHeadValue } from "./write-entry";

const PAGE = 500;

/** The stored text as the verifier reads it: written down here again, apart from the code that writes entries. */
const StoredText = z.strictObject({
  chain: z.string(),
  sequence: z.int(),
  at: z.string(),
  person: z.strictObject({ id: z.int().nullable(), name: z.string() }),
  capacity: z.string().nullable(),
  act: z.string(),
  subject: z.strictObject({ type: z.string(), id: z.string(), label: z.string() }),
  was: z.json(),
  now: z.json(),
  reason: z.string().nullable(),
  outcome: z.string(),
  records: z.array(z.strictObject({ type: z.string(), id: z.int(), hash: z.string() })),
});

export interface ReadChain {
  count: number;
  head: ChainHeadValue;
  /** Hash of the entry with this sequence number. */
  hashes: ReadonlyMap<number, string>;
  /** What entries that were done bind. */
  records: readonly BoundRecord[];
  faults: ChainFault[];
}

/** Reads a chain from its first entry to its last and tests each against its predecessor, its hash and its columns. */
export async function readChain(chain: string, tx: Transaction): Promise<ReadChain> {
  const hashes = new Map<number, string>();
  const records: BoundRecord[] = [];
  const faults: ChainFault[] = [];
  let head: ChainHeadValue = { sequence: 0, hash: GENESIS_HASH };
  let count = 0;
  for (let page = await nextPage(chain, 0, tx); page.length > 0; page = await nextPage(chain, head.sequence, tx)) {
    for (const entry of page) {
      faults.push(...entryFaults(entry, head));
      records.push(...boundBy(entry));
      hashes.set(entry.sequence, entry.hash);
      head = { sequence: entry.sequence, hash: entry.hash };
      count += 1;
    }
  }
  return { count, head, hashes, records, faults };
}

function nextPage(chain: string, after: number, tx: Transaction): Promise<HistoryEntry[]> {
  return HistoryEntry.findAll({
    where: { chain, sequence: { [Op.gt]: after } },
    order: [["sequence", "ASC"]],
    limit: PAGE,
    transaction: tx,
  });
}

function entryFaults(entry: HistoryEntry, before: ChainHeadValue): ChainFault[] {
  const where = `entry ${entry.sequence}`;
  const faults: ChainFault[] = [];
  if (entry.sequence !== before.sequence + 1) faults.push(chainFault("gap", where));
  if (entry.previousHash !== before.hash) faults.push(chainFault("link", where));
  if (entry.hash !== entryHash(entry.previousHash, entry.canonicalText)) faults.push(chainFault("hash", where));
  const differing = differingColumns(entry);
  if (differing.length > 0) faults.push(chainFault("column", where, `It is ${differing.join(", ")}.`));
  return faults;
}

function differingColumns(entry: HistoryEntry): string[] {
  const text = parsedText(entry);
  if (!text) return ["the text itself, which cannot be read"];
  const pairs: [string, unknown, unknown][] = [
    ["chain", entry.chain, text.chain],
    ["sequence", entry.sequence, text.sequence],
    ["time", entry.at, text.at],
    ["person", [entry.personId, entry.printedName], [text.person.id, text.person.name]],
    ["capacity", entry.capacity, text.capacity],
    ["act", entry.act, text.act],
    [
      "subject",
      [entry.subjectType, entry.subjectId, entry.subjectLabel],
      [text.subject.type, text.subject.id, text.subject.label],
    ],
    ["was", entry.was ?? "null", canonicalJson(text.was)],
    ["now", entry.now ?? "null", canonicalJson(text.now)],
    ["reason", entry.reason, text.reason],
    ["outcome", entry.outcome, text.outcome],
  ];
  return pairs.filter(([, column, stored]) => canonicalJson(column) !== canonicalJson(stored)).map(([name]) => name);
}

function boundBy(entry: HistoryEntry): BoundRecord[] {
  const text = parsedText(entry);
  return text && text.outcome === "done" ? text.records : [];
}

function parsedText(entry: HistoryEntry): z.infer<typeof StoredText> | null {
  try {
    const parsed = StoredText.safeParse(JSON.parse(entry.canonicalText));
    return parsed.success ? parsed.data : null;
  } catch (problem) {
    if (problem instanceof SyntaxError) return null;
    throw problem;
  }
}

import { Op, type WhereOptions } from "sequelize";
import { z } from "zod";
import type { Outcome } from "@/lib/vocabulary/acts";
import { ChainHead } from "@/models/chain-head";
import { HistoryEntry } from "@/models/history-entry";

export interface HistoryFilter {
  chain?: string;
  personId?: number;
  act?: string;
  outcome?: Outcome;
  subjectType?: string;
  subjectId?: string;
  /** Inclusive, ISO 8601 UTC with milliseconds. */
  from?: string;
  /** Exclusive. */
  until?: string;
}

export interface HistoryRow {
  id: number;
  chain: string;
  sequence: number;
  at: string;
  personId: number | null;
  printedName: string;
  capacity: string | null;
  act: string;
  subjectType: string;
  subjectId: string;
  subjectLabel: string;
  was: z.infer<typeof StoredJson>;
  now: z.infer<typeof StoredJson>;
  reason: string | null;
  outcome: Outcome;
  hash: string;
}

export interface HistoryPage {
  rows: HistoryRow[];
  total: number;
  page: number;
  pages: number;
}

export interface ExportedEntry {
  sequence: number;
  previousHash: string;
  canonicalText: string;
  hash: string;
}

const StoredJson = z.json();

const PAGE_SIZE = 50;

/** One page of the history, newest first. */
export async function historyPage(filter: HistoryFilter, page = 1, pageSize = PAGE_SIZE): Promise<HistoryPage> {
  const { rows, count } = await HistoryEntry.findAndCountAll({
    where: conditions(filter),
    order: [["id", "DESC"]],
    limit: pageSize,
    offset: (page - 1) * pageSize,
  });
  return { rows: rows.map(historyRow), total: count, page, pages: Math.max(1, Math.ceil(count / pageSize)) };
}

/** A chain as it is stored, for checking it away from the installation. */
export async function exportedChain(chain: string): Promise<ExportedEntry[]> {
  const entries = await HistoryEntry.findAll({ where: { chain }, order: [["sequence", "ASC"]] });
  return entries.map(({ sequence, previousHash, canonicalText, hash }) => ({
    sequence,
    previousHash,
    canonicalText,
    hash,
  }));
}

/** Persons and acts that stand in a chain, to choose from. */
export async function historyChoices(
  chain: string,
): Promise<{ persons: { id: number; name: string }[]; acts: string[] }> {
  const entries = await HistoryEntry.findAll({
    attributes: ["personId", "printedName", "act"],
    where: { chain },
    group: ["person_id", "act"],
  });
  const names = new Map<number, string>();
  for (const { personId, printedName } of entries) if (personId !== null) names.set(personId, printedName);
  const persons = [...names].map(([id, name]) => ({ id, name }));
  return {
    persons: persons.sort((one, other) => one.name.localeCompare(other.name, "en")),
    acts: [...new Set(entries.map(({ act }) => act))].sort(),
  };
}

export async function headOf(chain: string): Promise<{ sequence: number; hash: string } | null> {
  const head = await ChainHead.findByPk(chain);
  return head ? { sequence: head.sequence, hash: head.hash } : null;
}

function conditions(filter: HistoryFilter): WhereOptions {
  const { from, until, chain, personId, act, outcome, subjectType, subjectId } = filter;
  const equal = Object.entries({ chain, personId, act, outcome, subjectType, subjectId });
  return {
    ...Object.fromEntries(equal.filter(([, value]) => value !== undefined)),
    ...(from === undefined && until === undefined
      ? {}
      : {
          at: { ...(from === undefined ? {} : { [Op.gte]: from }), ...(until === undefined ? {} : { [Op.lt]: until }) },
        }),
  };
}

function historyRow(entry: HistoryEntry): HistoryRow {
  const { id, chain, sequence, at, personId, printedName, capacity, act, reason, outcome, hash } = entry;
  const { subjectType, subjectId, subjectLabel } = entry;
  return {
    ...{ id, chain, sequence, at, personId, printedName, capacity, act, subjectType, subjectId, subjectLabel },
    was: storedValue(entry.was),
    now: storedValue(entry.now),
    ...{ reason, outcome, hash },
  };
}

function storedValue(text: string | null): z.infer<typeof StoredJson> {
  return text === null ? null : StoredJson.parse(JSON.parse(text));
}

import path from "node:path";
import sqlite3 from "sqlite3";
import { z } from "zod";

/**
 * What an act that was refused may still touch: the history with its heads, mails on their way, sessions, and who
 * looked at what.
 */
const LIVING = ["history_entries", "chain_heads", "outbox_messages", "sessions", "lookings", "sheets_seen"];

export interface HistoryRow {
  id: number;
  act: string;
  outcome: string;
  personId: number | null;
  reason: string | null;
}

/** Everything at one moment: the rows of every table that holds what people did, and what may go on beside them. */
export interface StoredState {
  tables: Record<string, string[]>;
  history: HistoryRow[];
  /** Keys of all mails ever asked for; their delivery goes on by itself. */
  mails: string[];
}

const Named = z.array(z.object({ name: z.string() }));
const History = z.array(
  z.object({
    id: z.int(),
    act: z.string(),
    outcome: z.string(),
    personId: z.int().nullable(),
    reason: z.string().nullable(),
  }),
);

/** Reads the application's own file beside it. */
export async function storedState(dataFolder: string): Promise<StoredState> {
  const database = await opened(path.join(dataFolder, "leeboard.sqlite"));
  try {
    await rows(database, "BEGIN");
    const names = Named.parse(
      await rows(
        database,
        "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%' ORDER BY name",
      ),
    ).map(({ name }) => name);
    const missing = LIVING.filter((name) => !names.includes(name));
    if (missing.length > 0) throw new Error(`There is no table ${missing.join(", ")} to leave out.`);

    const tables: Record<string, string[]> = {};
    for (const name of names.filter((each) => !LIVING.includes(each))) {
      tables[name] = (await rows(database, `SELECT * FROM ${name}`)).map((row) => JSON.stringify(row)).sort();
    }
    const history = await rows(
      database,
      "SELECT id, act, outcome, person_id AS personId, reason FROM history_entries ORDER BY id",
    );
    const mails = z.array(z.object({ key: z.string() }));
    const keys = mails.parse(await rows(database, "SELECT key FROM outbox_messages ORDER BY id"));
    return { tables, history: History.parse(history), mails: keys.map(({ key }) => key) };
  } finally {
    await closed(database);
  }
}

/** Rows of the application's own file, each of the shape that is asked for. */
export async function storedRows<Shape extends z.ZodType>(
  dataFolder: string,
  statement: string,
  shape: Shape,
): Promise<z.output<Shape>[]> {
  const database = await opened(path.join(dataFolder, "leeboard.sqlite"));
  try {
    return z.array(shape).parse(await rows(database, statement));
  } finally {
    await closed(database);
  }
}

function opened(file: string): Promise<sqlite3.Database> {
  return new Promise((resolve, reject) => {
    const database = new sqlite3.Database(file, sqlite3.OPEN_READONLY, (problem) =>
      problem ? reject(problem) : resolve(database),
    );
  });
}

function rows(database: sqlite3.Database, statement: string): Promise<unknown[]> {
  return new Promise((resolve, reject) => {
    database.all(statement, (problem: Error | null, found: unknown[]) => (problem ? reject(problem) : resolve(found)));
  });
}

function closed(database: sqlite3.Database): Promise<void> {
  return new Promise((resolve, reject) => database.close((problem) => (problem ? reject(problem) : resolve())));
}

import "server-only";
import { AsyncLocalStorage } from "node:async_hooks";
import { mkdirSync } from "node:fs";
import path from "node:path";
import { QueryTypes, Sequelize, Transaction } from "sequelize";
import { guardWrites } from "./guard-writes";
import { closeAllConnections, discardConnection, prepareConnections, pointAt } from "./connections";

interface Store {
  sequelize: Sequelize;
  inWrite: AsyncLocalStorage<true>;
  tail: Promise<unknown>;
  /** The file that is open, or that will be. */
  file: string;
}

declare global {
  // Next evaluates a module once per bundle; the queue has to be one per process.
  var __leeboardDatabase: Store | undefined;
}

export function databaseFile(): string {
  return path.join(process.env.LEEBOARD_DATA ?? "data", "leeboard.sqlite");
}

function createStore(): Store {
  const file = databaseFile();
  const sequelize = new Sequelize({
    dialect: "sqlite",
    storage: file,
    logging: false,
    typeValidation: true,
    transactionType: Transaction.TYPES.IMMEDIATE,
    retry: { max: 1 },
    define: { timestamps: false, underscored: true },
  });
  prepareConnections(sequelize);
  guardWrites(sequelize);
  return { sequelize, inWrite: new AsyncLocalStorage(), tail: Promise.resolve(), file };
}

const store = (globalThis.__leeboardDatabase ??= createStore());

export const database = store.sequelize;

/** Opens the file (made when missing) and puts it into write-ahead mode, which sticks to the file. */
export async function openDatabase(file: string = databaseFile()): Promise<void> {
  mkdirSync(path.dirname(file), { recursive: true });
  pointAt(database, file);
  store.file = file;
  await database.query("PRAGMA journal_mode = WAL", { type: QueryTypes.SELECT });
}

/** The folder of the open database: files are kept beside it. */
export function dataFolder(): string {
  return path.dirname(store.file);
}

/** Waits for the last write and closes every connection; `openDatabase` may follow, also with another file. */
export async function closeDatabase(): Promise<void> {
  await store.tail;
  await closeAllConnections(database);
}

/**
 * Runs the work in one IMMEDIATE transaction, after every write asked for before it.
 * Queued: writers waiting inside SQLite would hold the thread pool's four threads, and the lock's holder could not go on.
 */
export function inTransaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  if (store.inWrite.getStore()) throw new Error("A transaction inside a transaction would wait for itself for ever.");
  const result = store.tail.then(() => store.inWrite.run(true, () => runTransaction(work)));
  store.tail = result.catch(() => undefined);
  return result;
}

/** Several reads that have to agree, on a connection of their own; a write in it is refused by SQLite. */
export async function inSnapshot<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  const tx = await database.transaction({ type: Transaction.TYPES.DEFERRED });
  try {
    await database.query("PRAGMA query_only = ON", { transaction: tx });
    return await work(tx);
  } finally {
    await tx.rollback();
  }
}

async function runTransaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  const tx = await database.transaction({ type: Transaction.TYPES.IMMEDIATE });
  let committing = false;
  try {
    const result = await work(tx);
    committing = true;
    await tx.commit();
    return result;
  } catch (problem) {
    // A COMMIT that failed leaves its connection open and holding the write lock.
    if (committing) await discardConnection(database, tx);
    else await tx.rollback();
    throw problem;
  }
}

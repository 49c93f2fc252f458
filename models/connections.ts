import type { Sequelize, Transaction } from "sequelize";

/** What we use of the driver's connection. */
interface SqliteConnection {
  configure(option: "busyTimeout", milliseconds: number): void;
  exec(sql: string, done: (problem: Error | null) => void): void;
  close(done: (problem: Error | null) => void): void;
}

function isSqliteConnection(value: unknown): value is SqliteConnection {
  return typeof value === "object" && value !== null && "configure" in value && "exec" in value && "close" in value;
}

const PRAGMAS = "PRAGMA foreign_keys = ON; PRAGMA recursive_triggers = ON; PRAGMA synchronous = NORMAL;";

/** Sequelize's name of the connection that queries outside a transaction share. */
const SHARED = "default";

/** Connections on their way out: the file may be copied or removed only after the last of them. */
const closing = new Set<Promise<void>>();

/** Sequelize calls no connection hook for SQLite, so that the pragmas of a connection are set where it is made. */
export function prepareConnections(sequelize: Sequelize): void {
  const manager = sequelize.connectionManager;
  const original = manager.getConnection.bind(manager);
  const ready = new WeakMap<object, Promise<void>>();
  manager.getConnection = async (options) => {
    const connection = await original(options);
    let prepared = ready.get(connection);
    if (!prepared) {
      prepared = prepare(connection);
      ready.set(connection, prepared);
    }
    await prepared;
    return connection;
  };
  manager.releaseConnection = (connection) => {
    const open = openConnections(sequelize);
    const key = Object.keys(open).find((name) => name !== SHARED && open[name] === connection);
    if (key === undefined) return;
    delete open[key];
    const closed = close(connection).finally(() => closing.delete(closed));
    closing.add(closed);
  };
}

/** The next connections go to this file. The driver reads the setting each time that it opens one. */
export function pointAt(sequelize: Sequelize, file: string): void {
  const options: unknown = Reflect.get(sequelize, "options");
  if (!isRecord(options)) throw new Error("The database driver keeps its settings elsewhere than expected.");
  options.storage = file;
}

export async function closeAllConnections(sequelize: Sequelize): Promise<void> {
  const open = openConnections(sequelize);
  for (const [key, connection] of Object.entries(open)) {
    delete open[key];
    await close(connection);
  }
  await Promise.all(closing);
}

/** Rolls back and closes what a failed COMMIT left open. */
export async function discardConnection(sequelize: Sequelize, tx: Transaction): Promise<void> {
  const open = openConnections(sequelize);
  const key = "id" in tx && typeof tx.id === "string" ? tx.id : "";
  const connection = open[key];
  if (!connection) return;
  delete open[key];
  await execute(connection, "ROLLBACK").catch(() => undefined);
  await close(connection);
}

async function prepare(connection: object): Promise<void> {
  if (!isSqliteConnection(connection)) throw new Error("The database driver gave a connection of an unknown kind.");
  connection.configure("busyTimeout", 5000);
  await execute(connection, PRAGMAS);
}

function openConnections(sequelize: Sequelize): Record<string, unknown> {
  const manager: object = sequelize.connectionManager;
  if (!("connections" in manager) || !isRecord(manager.connections)) {
    throw new Error("The database driver keeps its connections elsewhere than expected.");
  }
  return manager.connections;
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null;
}

function execute(connection: unknown, sql: string): Promise<void> {
  if (!isSqliteConnection(connection)) return Promise.reject(new Error("Not a database connection."));
  return new Promise((resolve, reject) => {
    connection.exec(sql, (problem) => (problem ? reject(problem) : resolve()));
  });
}

function close(connection: unknown): Promise<void> {
  if (!isSqliteConnection(connection)) return Promise.resolve();
  return new Promise((resolve, reject) => {
    connection.close((problem) => (problem ? reject(problem) : resolve()));
  });
}

import { appendOnly, type Migration } from "./migration";

interface Closed {
  type: string;
  table: string;
  /** The column that is filled in by a later act. */
  column: string;
  /** What was filled in, of a row under the given name. */
  facts: (row: string) => string;
  product: (row: string) => string;
}

/** Rows that one later act may close: what it filled in is kept again here, so that a history entry can bind it. */
export const CLOSED: readonly Closed[] = [
  {
    type: "comment",
    table: "comments",
    column: "settled_at",
    facts: (row) =>
      `json_array(${row}.settled_by_id, ${row}.settled_by_name, ${row}.settled_at, ${row}.settled_reason)`,
    product: (row) => `(SELECT product_id FROM proposals WHERE id = ${row}.proposal_id)`,
  },
  {
    type: "membership",
    table: "memberships",
    column: "until_at",
    facts: (row) => `json_array(${row}.until_at)`,
    product: (row) => `${row}.product_id`,
  },
  {
    type: "deputy",
    table: "deputies",
    column: "ended_at",
    facts: (row) => `json_array(${row}.ended_at)`,
    product: (row) => `${row}.product_id`,
  },
  {
    type: "attachment",
    table: "attachments",
    column: "voided_at",
    facts: (row) => `json_array(${row}.voided_by_id, ${row}.voided_at, ${row}.void_reason)`,
    product: (row) => `${row}.product_id`,
  },
];

function keepClosing({ type, table, column, facts, product }: Closed, event: string): string {
  return `CREATE TRIGGER ${table}_closing_${event} AFTER ${event} ON ${table} WHEN NEW.${column} IS NOT NULL
    BEGIN INSERT INTO closings (product_id, record_type, record_id, facts)
      VALUES (${product("NEW")}, '${type}', NEW.id, ${facts("NEW")}); END`;
}

export const closings: Migration = {
  name: "0006-closings",
  statements: [
    `CREATE TABLE closings (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      record_type TEXT NOT NULL,
      record_id INTEGER NOT NULL,
      facts TEXT NOT NULL CHECK (json_valid(facts)),
      UNIQUE (record_type, record_id)
    ) STRICT`,
    ...appendOnly("closings"),
    ...CLOSED.flatMap((closed) => [keepClosing(closed, "INSERT"), keepClosing(closed, "UPDATE")]),
  ],
};

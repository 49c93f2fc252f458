/** One step of the schema: statements run in order in one transaction, and never changed once they were released. */
export interface Migration {
  name: string;
  statements: readonly string[];
}

/** Triggers that refuse to change or delete rows of a table that only grows. */
export function appendOnly(table: string): string[] {
  return [refuseUpdate(table), refuseDelete(table)];
}

export function refuseUpdate(table: string): string {
  return `CREATE TRIGGER ${table}_never_changes BEFORE UPDATE ON ${table}
    BEGIN SELECT RAISE(ABORT, '${table} is append-only: a row never changes'); END`;
}

export function refuseDelete(table: string): string {
  return `CREATE TRIGGER ${table}_never_deleted BEFORE DELETE ON ${table}
    BEGIN SELECT RAISE(ABORT, '${table}: a row is never deleted'); END`;
}

/** A trigger that refuses an update unless the listed columns stay as they are. */
export function fixedColumns(table: string, columns: readonly string[]): string {
  const moved = columns.map((column) => `OLD.${column} IS NOT NEW.${column}`).join(" OR ");
  return `CREATE TRIGGER ${table}_fixed_columns BEFORE UPDATE ON ${table} WHEN ${moved}
    BEGIN SELECT RAISE(ABORT, '${table}: ${columns.join(", ")} never change'); END`;
}

/** A trigger on insertion that refuses a row of which the condition holds. */
export function refuseInsert(table: string, name: string, condition: string, sentence: string): string {
  return `CREATE TRIGGER ${table}_${name} BEFORE INSERT ON ${table} WHEN ${condition}
    BEGIN SELECT RAISE(ABORT, '${sentence.replaceAll("'", "''")}'); END`;
}

/** ISO 8601, UTC, milliseconds: the one form in which a time is stored, so that text order is time order. */
export function isTime(column: string): string {
  return `${column} GLOB '[0-9][0-9][0-9][0-9]-[0-9][0-9]-[0-9][0-9]T[0-9][0-9]:[0-9][0-9]:[0-9][0-9].[0-9][0-9][0-9]Z'`;
}

export function isDay(column: string): string {
  return `${column} GLOB '[0-9][0-9][0-9][0-9]-[0-9][0-9]-[0-9][0-9]'`;
}

export function isHash(column: string): string {
  return `length(${column}) = 64 AND ${column} NOT GLOB '*[^0-9a-f]*'`;
}

export function isOneOf(column: string, values: readonly string[]): string {
  return `${column} IN (${values.map((value) => `'${value}'`).join(", ")})`;
}

import { QueryTypes, type Transaction } from "sequelize";
import { database } from "@/models/database";
import { CLOSED } from "@/models/migrations/0006-closings";
import { recordsOfProduct, type BoundRecord } from "./bound-records";
import { chainFault, type ChainFault } from "./chain-report";

/** Each bound row stands in exactly one entry, as it was then; each row that an entry names is there. */
export async function verifyBindings(
  productId: number,
  bound: readonly BoundRecord[],
  tx: Transaction,
): Promise<{ count: number; faults: ChainFault[] }> {
  const stored = await recordsOfProduct(productId, tx);
  const entries = new Map(bound.map((record) => [nameOf(record), record.hash]));
  const rows = new Map(stored.map((record) => [nameOf(record), record.hash]));
  const faults = [
    ...[...rows].flatMap(([name, hash]) => rowFaults(name, hash, entries.get(name))),
    ...[...entries.keys()].filter((name) => !rows.has(name)).map((name) => chainFault("removed", name)),
    ...twice(bound).map((name) => chainFault("altered", name, "Two entries name it.")),
    ...(await closedWithoutAct(productId, tx)),
  ];
  return { count: stored.length, faults };
}

function nameOf({ type, id }: BoundRecord): string {
  return `${type} ${id}`;
}

function rowFaults(name: string, hash: string, bound: string | undefined): ChainFault[] {
  if (bound === undefined) return [chainFault("unbound", name)];
  return bound === hash ? [] : [chainFault("altered", name)];
}

function twice(bound: readonly BoundRecord[]): string[] {
  const seen = new Set<string>();
  return bound.map(nameOf).filter((name) => seen.has(name) || !seen.add(name));
}

async function closedWithoutAct(productId: number, tx: Transaction): Promise<ChainFault[]> {
  const faults: ChainFault[] = [];
  for (const { type, table, column, facts, product } of CLOSED) {
    const rows = await database.query<{ id: number }>(
      `SELECT t.id FROM ${table} t LEFT JOIN closings c ON c.record_type = '${type}' AND c.record_id = t.id
        WHERE ${product("t")} = :productId AND (t.${column} IS NOT NULL) + (c.id IS NOT NULL) > 0
          AND c.facts IS NOT (CASE WHEN t.${column} IS NULL THEN NULL ELSE ${facts("t")} END)`,
      { type: QueryTypes.SELECT, transaction: tx, replacements: { productId } },
    );
    faults.push(...rows.map(({ id }) => chainFault("closing", `${type} ${id}`)));
  }
  return faults;
}

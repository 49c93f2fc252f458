import { QueryTypes, type Transaction } from "sequelize";
import { database } from "@/models/database";
import { canonicalJson } from "./canonical-json";
import { textHash } from "./text-hash";

/** A row that a history entry binds: altered, removed or slipped in later, it no longer agrees with the entry. */
export interface BoundRecord {
  type: string;
  id: number;
  hash: string;
}

interface BoundTable {
  type: string;
  table: string;
  /** Columns that never change; the others may be filled in by a later act. */
  columns: string;
  /** The product's id, of a row `t`. */
  product: string;
}

const OF_PROPOSAL = "(SELECT product_id FROM proposals WHERE id = t.proposal_id)";
const EDITS_OF_ROUND = `(SELECT json_group_array(json_array(position, line_id, operation, base_letter, body))
  FROM (SELECT * FROM round_edits WHERE round_id = t.id ORDER BY position, id)) AS edits`;
const TRANSFERS_OF_ROUND = `(SELECT json_group_array(json_array(position, body))
  FROM (SELECT * FROM round_transfers WHERE round_id = t.id ORDER BY position)) AS transfers`;

const BOUND_TABLES: readonly BoundTable[] = [
  { type: "issue", table: "issues", columns: "t.*", product: "t.product_id" },
  { type: "round", table: "rounds", columns: `t.*, ${EDITS_OF_ROUND}, ${TRANSFERS_OF_ROUND}`, product: OF_PROPOSAL },
  { type: "signature", table: "signatures", columns: "t.*", product: "t.product_id" },
  { type: "objection", table: "objections", columns: "t.*", product: OF_PROPOSAL },
  {
    type: "comment",
    table: "comments",
    columns: `t.id, t.proposal_id, t.round_id, t.number, t.parent_id, t.line_id, t.field, t.author_id, t.printed_name,
      t.body, t.suggestion, t.asks_action, t.written_at`,
    product: OF_PROPOSAL,
  },
  { type: "baseline", table: "baselines", columns: "t.*", product: "t.product_id" },
  { type: "monte_carlo_run", table: "monte_carlo_runs", columns: "t.*", product: "t.product_id" },
  {
    type: "attachment",
    table: "attachments",
    columns: `t.id, t.owner_type, t.owner_id, t.name, t.media_type, t.size, t.sha256, t.source_date, t.added_by_id,
      t.added_at`,
    product: "t.product_id",
  },
  {
    type: "membership",
    table: "memberships",
    columns: "t.id, t.user_id, t.product_id, t.role, t.from_at",
    product: "t.product_id",
  },
  {
    type: "deputy",
    table: "deputies",
    columns: "t.id, t.product_id, t.holder_id, t.deputy_id, t.from_day, t.until_day, t.named_by_id, t.named_at",
    product: "t.product_id",
  },
  { type: "closing", table: "closings", columns: "t.*", product: "t.product_id" },
];

const NEWEST = `SELECT ${BOUND_TABLES.map(({ table }) => `(SELECT coalesce(max(id), 0) FROM ${table}) AS ${table}`).join(", ")}`;

/** The newest id of each bound table, to be compared after the work of an act. */
export async function newestRecordIds(tx: Transaction): Promise<Record<string, number>> {
  const [row] = await database.query<Record<string, number>>(NEWEST, { type: QueryTypes.SELECT, transaction: tx });
  return row ?? {};
}

/** The rows written since, with their hashes. */
export async function recordsSince(before: Record<string, number>, tx: Transaction): Promise<BoundRecord[]> {
  const after = await newestRecordIds(tx);
  const records: BoundRecord[] = [];
  for (const spec of BOUND_TABLES) {
    const last = before[spec.table] ?? 0;
    if ((after[spec.table] ?? 0) > last) records.push(...(await hashedRows(spec, "t.id > :value", last, tx)));
  }
  return records;
}

/** Every bound row of a product as it stands now. */
export async function recordsOfProduct(productId: number, tx: Transaction): Promise<BoundRecord[]> {
  const records: BoundRecord[] = [];
  for (const spec of BOUND_TABLES) {
    records.push(...(await hashedRows(spec, `${spec.product} = :value`, productId, tx)));
  }
  return records;
}

async function hashedRows(
  { type, table, columns }: BoundTable,
  condition: string,
  value: number,
  tx: Transaction,
): Promise<BoundRecord[]> {
  const rows = await database.query<Record<string, unknown>>(
    `SELECT ${columns} FROM ${table} t WHERE ${condition} ORDER BY t.id`,
    { type: QueryTypes.SELECT, transaction: tx, replacements: { value } },
  );
  return rows.map((row) => ({ type, id: Number(row.id), hash: textHash("record", canonicalJson({ type, row })) }));
}

import { QueryTypes } from "sequelize";
import { database } from "@/models/database";

export interface OutboxState {
  waiting: number;
  /** When the oldest mail that waits was written. */
  oldestSince: string | null;
  failed: number;
  lastProblem: string | null;
}

/** How long mail has been waiting: shown to the administrator. */
export async function outboxState(): Promise<OutboxState> {
  const [row] = await database.query<OutboxState>(
    `SELECT count(*) FILTER (WHERE sent_at IS NULL AND failed_at IS NULL) AS waiting,
      min(created_at) FILTER (WHERE sent_at IS NULL AND failed_at IS NULL) AS oldestSince,
      count(*) FILTER (WHERE failed_at IS NOT NULL) AS failed,
      (SELECT last_problem FROM outbox_messages WHERE last_problem IS NOT NULL ORDER BY id DESC LIMIT 1) AS lastProblem
      FROM outbox_messages`,
    { type: QueryTypes.SELECT },
  );
  return row ?? { waiting: 0, oldestSince: null, failed: 0, lastProblem: null };
}

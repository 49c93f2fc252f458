import { QueryTypes } from "sequelize";
import { database, inTransaction } from "@/models/database";
import { OutboxMessage } from "@/models/outbox-message";

export interface ClaimedMail {
  id: number;
  template: string;
  data: string;
  messageId: string;
  attempts: number;
  recipientName: string;
  recipientAddress: string;
  recipientActive: boolean;
}

interface ClaimedRow extends Omit<ClaimedMail, "recipientActive"> {
  recipientActive: number;
}

/** Longer than any attempt to send lasts: only a process that died leaves a lease to run out. */
const LEASE_MS = 120_000;

const DUE = `sent_at IS NULL AND failed_at IS NULL AND next_attempt_at <= :at
  AND (leased_until IS NULL OR leased_until <= :at)`;

/** Takes the oldest mail that is due, for this process alone until its lease runs out. */
export async function claimMail(now: Date): Promise<ClaimedMail | null> {
  const at = now.toISOString();
  // Looked up outside the write queue first: most of the time there is none.
  const due = await database.query(`SELECT 1 FROM outbox_messages WHERE ${DUE} LIMIT 1`, {
    type: QueryTypes.SELECT,
    replacements: { at },
  });
  if (due.length === 0) return null;
  const leasedUntil = new Date(now.getTime() + LEASE_MS).toISOString();
  return inTransaction(async (tx) => {
    const [row] = await database.query<ClaimedRow>(
      `UPDATE outbox_messages SET leased_until = :leasedUntil, attempts = attempts + 1
        WHERE id = (SELECT id FROM outbox_messages WHERE ${DUE} ORDER BY next_attempt_at, id LIMIT 1)
        RETURNING id, template, data, message_id AS messageId, attempts,
          (SELECT name FROM users WHERE id = to_user_id) AS recipientName,
          (SELECT email FROM users WHERE id = to_user_id) AS recipientAddress,
          (SELECT active FROM users WHERE id = to_user_id) AS recipientActive`,
      { type: QueryTypes.SELECT, transaction: tx, replacements: { at, leasedUntil } },
    );
    return row ? { ...row, recipientActive: row.recipientActive === 1 } : null;
  });
}

export async function markSent(id: number, now: Date): Promise<void> {
  await settle(id, { sentAt: now.toISOString(), lastProblem: null });
}

export async function markFailed(id: number, problem: string, now: Date): Promise<void> {
  await settle(id, { failedAt: now.toISOString(), lastProblem: problem });
}

export async function postpone(id: number, problem: string, next: Date): Promise<void> {
  await settle(id, { nextAttemptAt: next.toISOString(), lastProblem: problem });
}

async function settle(
  id: number,
  values: Partial<Record<"sentAt" | "failedAt" | "nextAttemptAt" | "lastProblem", string | null>>,
) {
  const { nextAttemptAt, ...others } = values;
  const moved = nextAttemptAt ? { nextAttemptAt } : {};
  await inTransaction((tx) =>
    OutboxMessage.update({ ...others, ...moved, leasedUntil: null }, { where: { id }, transaction: tx }),
  );
}

import { randomUUID } from "node:crypto";
import type { Transaction } from "sequelize";
import { OutboxMessage } from "@/models/outbox-message";
import type { MailData, MailTemplate } from "./message-schemas";

export interface NewMail<T extends MailTemplate> {
  /** Says what the mail is about and to whom: a second mail under the same key is not sent. */
  key: string;
  toUserId: number;
  template: T;
  data: MailData[T];
}

/** Puts a mail into the outbox, in the transaction of the act that it tells of. False when its key was used before. */
export async function enqueueMail<T extends MailTemplate>(
  { key, toUserId, template, data }: NewMail<T>,
  tx: Transaction,
  at: string,
): Promise<boolean> {
  if ((await OutboxMessage.count({ where: { key }, transaction: tx })) > 0) return false;
  await OutboxMessage.create(
    {
      ...{ key, toUserId, template, data: JSON.stringify(data) },
      messageId: `<${randomUUID()}@leeboard.invalid>`,
      createdAt: at,
      nextAttemptAt: at,
    },
    { transaction: tx },
  );
  return true;
}

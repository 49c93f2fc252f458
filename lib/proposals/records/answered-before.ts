import type { Transaction } from "sequelize";
import type { z } from "zod";
import { canonicalJson } from "@/lib/audit/canonical-json";
import type { Act } from "@/lib/vocabulary/acts";
import { IdempotencyKey } from "@/models/idempotency-key";

interface FormSent {
  userId: number;
  act: Act;
  key: string;
}

/** What a form was answered when it was first sent; null when this is the first time. */
export async function answeredBefore<T>(form: FormSent, shape: z.ZodType<T>, tx: Transaction): Promise<T | null> {
  const { userId, act, key } = form;
  const row = await IdempotencyKey.findOne({ where: { userId, act, key }, transaction: tx });
  return row ? shape.parse(JSON.parse(row.result)) : null;
}

export async function keepAnswer(form: FormSent, answer: unknown, at: string, tx: Transaction): Promise<void> {
  const { userId, act, key } = form;
  await IdempotencyKey.create({ userId, act, key, result: canonicalJson(answer), madeAt: at }, { transaction: tx });
}

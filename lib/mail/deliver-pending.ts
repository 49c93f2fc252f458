import { z } from "zod";
import type { Clock } from "@/lib/vocabulary/clock";
import { claimMail, markFailed, markSent, postpone, type ClaimedMail } from "./claim-mail";
import { renderMail } from "./message-schemas";
import type { SendMail } from "./transport";

export interface Delivery {
  send: SendMail;
  clock: Clock;
  baseUrl: string;
}

export interface DeliveryCount {
  sent: number;
  postponed: number;
  failed: number;
}

const FIRST_WAIT_MS = 5_000;
const LONGEST_WAIT_MS = 60 * 60_000;
const MOST_AT_A_TIME = 100;

/**
 * Sends what is due: claim, send, mark, each by itself, so that nothing slow is inside a transaction.
 * A process that dies between sending and marking sends again, under the same Message-ID.
 */
export async function deliverPending(delivery: Delivery): Promise<DeliveryCount> {
  const count = { sent: 0, postponed: 0, failed: 0 };
  for (let turn = 0; turn < MOST_AT_A_TIME; turn += 1) {
    const mail = await claimMail(delivery.clock());
    if (!mail) break;
    count[await deliver(mail, delivery)] += 1;
  }
  return count;
}

async function deliver(mail: ClaimedMail, { send, clock, baseUrl }: Delivery): Promise<keyof DeliveryCount> {
  if (!mail.recipientActive || !z.email().safeParse(mail.recipientAddress).success) {
    await markFailed(mail.id, "The recipient has no open account with a usable address.", clock());
    return "failed";
  }
  try {
    const frame = { recipientName: mail.recipientName, baseUrl };
    const message = renderMail(mail.template, JSON.parse(mail.data), frame);
    const to = { name: mail.recipientName, address: mail.recipientAddress };
    await send({ to, ...message, messageId: mail.messageId });
  } catch (problem) {
    return refused(mail, problem, clock());
  }
  await markSent(mail.id, clock());
  return "sent";
}

async function refused(mail: ClaimedMail, problem: unknown, now: Date): Promise<"failed" | "postponed"> {
  const sentence = problem instanceof Error ? problem.message : String(problem);
  if (isPermanent(problem)) {
    await markFailed(mail.id, sentence, now);
    return "failed";
  }
  await postpone(mail.id, sentence, new Date(now.getTime() + waitAfter(mail.attempts)));
  return "postponed";
}

/** Doubles from five seconds to an hour. */
export function waitAfter(attempts: number): number {
  return Math.min(FIRST_WAIT_MS * 2 ** Math.max(0, attempts - 1), LONGEST_WAIT_MS);
}

/** Trying again helps with a server that is down or busy, not with an answer of 500 and above or an unreadable row. */
function isPermanent(problem: unknown): boolean {
  if (!(problem instanceof Error)) return false;
  const code: unknown = Reflect.get(problem, "code");
  const responseCode: unknown = Reflect.get(problem, "responseCode");
  if (typeof responseCode === "number") return responseCode >= 500;
  // Errors of a connection carry a code; what was thrown without one is a fault of the message itself.
  return code === undefined || code === "EENVELOPE";
}

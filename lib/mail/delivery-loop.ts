import { systemClock } from "@/lib/vocabulary/clock";
import { deliverPending, type Delivery } from "./deliver-pending";
import { smtpTransport } from "./transport";

const PAUSE_MS = 2_000;

export interface DeliveryLoop {
  /** Ends the loop after the mail that is on its way. */
  stop(): Promise<void>;
}

/** Sends the outbox as long as the process lives. It keeps no process alive and never ends by an error. */
export function startDeliveryLoop(overrides: Partial<Delivery> & { pauseMs?: number } = {}): DeliveryLoop {
  const { pauseMs = PAUSE_MS, ...given } = overrides;
  const delivery: Delivery = {
    send: given.send ?? smtpTransport(),
    clock: given.clock ?? systemClock,
    baseUrl: given.baseUrl ?? process.env.NEXTAUTH_URL ?? "http://127.0.0.1:3000",
  };
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let turn: Promise<void> = Promise.resolve();

  const next = () => {
    turn = deliverOnce(delivery).then(() => {
      if (stopped) return;
      timer = setTimeout(next, pauseMs);
      timer.unref();
    });
  };
  next();

  return {
    stop: async () => {
      stopped = true;
      clearTimeout(timer);
      await turn;
    },
  };
}

async function deliverOnce(delivery: Delivery): Promise<void> {
  try {
    await deliverPending(delivery);
  } catch (problem) {
    // The outbox could not be read or marked; the rows stay and the next turn tries again.
    process.stderr.write(`Mail could not be delivered this time. ${String(problem)}\n`);
  }
}

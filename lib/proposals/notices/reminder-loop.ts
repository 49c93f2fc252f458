import { systemClock } from "@/lib/vocabulary/clock";
import { remindSigners } from "./remind-signers";

const PAUSE_MS = 15 * 60_000;

/** Reminds of passed dates as long as the process lives. It keeps no process alive and never ends by an error. */
export function startReminderLoop(pauseMs: number = PAUSE_MS): { stop(): void } {
  let timer: NodeJS.Timeout | undefined;
  let isStopped = false;
  const next = () => {
    void remindOnce().then(() => {
      if (isStopped) return;
      timer = setTimeout(next, pauseMs);
      timer.unref();
    });
  };
  next();
  return {
    stop: () => {
      isStopped = true;
      clearTimeout(timer);
    },
  };
}

async function remindOnce(): Promise<void> {
  try {
    await remindSigners(systemClock);
  } catch (problem) {
    // What could not be reminded of now is still due at the next turn.
    process.stderr.write(`Nobody could be reminded this time. ${String(problem)}\n`);
  }
}

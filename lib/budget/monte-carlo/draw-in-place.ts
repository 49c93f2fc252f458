import { formatExact } from "@/lib/units/format-number";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { drawIssue, type DrawIssueInput, type DrawnIssue } from "./draw-issue";
import type { RunOptions } from "./run-monte-carlo";

/** Each run keeps one processor busy: more at once would leave none to answer with. */
export const RUNS_AT_ONCE = 2;

interface RunningRun {
  draws: number;
  done: number;
}

declare global {
  // Next evaluates a module once per bundle; the places have to be the same for all of them.
  var __leeboardRuns: Map<number, RunningRun> | undefined;
}

const running = (globalThis.__leeboardRuns ??= new Map<number, RunningRun>());

/**
 * Draws in a place of its own: a person has one, the installation a few.
 *
 * @throws Refusal "too_many_attempts" while there is none
 */
export async function drawInPlace(actor: Actor, input: DrawIssueInput, options: RunOptions): Promise<DrawnIssue> {
  const { userId } = actor;
  const { draws } = input;
  const own = running.get(userId);
  if (own) throw new Refusal("too_many_attempts", ownRunSentence(own));
  if (running.size >= RUNS_AT_ONCE) throw new Refusal("too_many_attempts", HOUSE_BUSY);
  const run: RunningRun = { draws, done: 0 };
  const onProgress = (done: number): void => {
    run.done = done;
    options.onProgress?.(done);
  };
  running.set(userId, run);
  try {
    return await drawIssue(actor, input, { ...options, onProgress });
  } finally {
    running.delete(userId);
  }
}

const HOUSE_BUSY = `${RUNS_AT_ONCE} runs of other people are being drawn now. Try again in a minute.`;

function ownRunSentence({ done, draws }: RunningRun): string {
  const count = `${formatExact(done)} of ${formatExact(draws)} draws`;
  return `A run of yours is at ${count}: one at a time. Wait until it is done, or stop it.`;
}

import path from "node:path";
import type { Worker } from "node:worker_threads";
import { monteCarlo, type MonteCarloOutcome } from "@/lib/evaluation/uncertainty/monte-carlo";
import { Refusal } from "@/lib/vocabulary/refusal";
import { MonteCarloMessage, type MonteCarloJob } from "./job";

// Asked for while running: a bundler that sees where a thread begins takes every file of the repository for it.
const threads = process.getBuiltinModule("node:worker_threads");

/** A run that takes longer has gone wrong: a hundred thousand draws of a large budget take some ten seconds. */
const LONGEST_RUN_MS = 120_000;

export interface RunOptions {
  /** Told from time to time how many draws are done. */
  onProgress?: (done: number) => void;
  /** Stops the run. */
  signal?: AbortSignal;
  timeoutMs?: number;
  /** The built thread; that of the built application where nothing is said. */
  workerFile?: string;
  /** On this thread, where nobody waits for an answer meanwhile: the filling of the demo. */
  onThisThread?: boolean;
}

/**
 * Draws a budget on a thread of its own, so that requests are answered meanwhile. The thread is gone when this settles.
 *
 * @throws Refusal if the run takes too long; Error if its thread fails; the signal's reason if it is stopped
 */
export async function runMonteCarlo(job: MonteCarloJob, options: RunOptions = {}): Promise<MonteCarloOutcome> {
  options.signal?.throwIfAborted();
  if (options.onThisThread) return drawnHere(job);
  const worker = new threads.Worker(options.workerFile ?? builtWorkerFile(), { workerData: job });
  try {
    return await outcomeOf(worker, options);
  } finally {
    await worker.terminate();
  }
}

function drawnHere({ state, operatingPoint, draws, seed }: MonteCarloJob): MonteCarloOutcome {
  const outcome = monteCarlo(state, operatingPoint, { draws, seed });
  if (!outcome) throw new Error("A run that nobody stopped has no result.");
  return outcome;
}

/** Beside the build that it belongs to. */
function builtWorkerFile(): string {
  return path.join(process.cwd(), ".next", "monte-carlo-worker.mjs");
}

function tooLong(ms: number): string {
  return `The run took longer than ${ms / 1000} s and was given up. Ask for fewer draws.`;
}

function outcomeOf(
  worker: Worker,
  { onProgress, signal, timeoutMs = LONGEST_RUN_MS }: RunOptions,
): Promise<MonteCarloOutcome> {
  return new Promise<MonteCarloOutcome>((resolve, reject) => {
    const timeout = setTimeout(() => reject(new Refusal("evaluation_refused", tooLong(timeoutMs))), timeoutMs);
    const stop = (): void => reject(signal?.reason);
    signal?.addEventListener("abort", stop, { once: true });
    const settled = (): void => {
      clearTimeout(timeout);
      signal?.removeEventListener("abort", stop);
    };
    worker.once("error", reject);
    worker.once("exit", (code) => reject(new Error(`The thread ended with code ${code} before it had a result.`)));
    worker.on("exit", settled);
    worker.on("message", (raw: unknown) => {
      const message = MonteCarloMessage.safeParse(raw);
      if (!message.success) reject(message.error);
      else if (message.data.type === "progress") onProgress?.(message.data.done);
      else resolve(message.data.outcome);
    });
  });
}

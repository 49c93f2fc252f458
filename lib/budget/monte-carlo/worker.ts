import { parentPort, workerData } from "node:worker_threads";
import { monteCarlo } from "@/lib/evaluation/uncertainty/monte-carlo";
import { MonteCarloJob, type MonteCarloMessage } from "./job";

/** A message for every hundredth of the draws, and for every such time: of a long run something is heard soon. */
const PROGRESS_STEPS = 100;
const PROGRESS_MS = 200;

/** The thread that draws a budget: built to a file of its own, given a job, it answers with progress and a result. */
function work(): void {
  if (!parentPort) throw new Error("The worker of the Monte Carlo runs is started as a thread.");
  const port = parentPort;
  const tell = (message: MonteCarloMessage): void => port.postMessage(message);
  const { state, operatingPoint, draws, seed } = jobOf(workerData);
  let told = { step: 0, at: performance.now() };
  const outcome = monteCarlo(state, operatingPoint, {
    draws,
    seed,
    onProgress: (done) => {
      const now = { step: Math.floor((done * PROGRESS_STEPS) / draws), at: performance.now() };
      if (now.step === told.step && now.at - told.at < PROGRESS_MS) return;
      told = now;
      tell({ type: "progress", done });
    },
  });
  if (outcome) tell({ type: "result", outcome });
}

/** Thrown as a plain error: of any other only the name would reach the other thread. */
function jobOf(data: unknown): MonteCarloJob {
  const parsed = MonteCarloJob.safeParse(data);
  if (parsed.success) return parsed.data;
  throw new Error(parsed.error.issues.map(({ path, message }) => `${path.join(".")}: ${message}`).join("\n"));
}

work();

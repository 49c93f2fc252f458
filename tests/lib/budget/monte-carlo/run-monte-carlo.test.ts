import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { MonteCarloJob } from "@/lib/budget/monte-carlo/job";
import { runMonteCarlo } from "@/lib/budget/monte-carlo/run-monte-carlo";
import { monteCarlo } from "@/lib/evaluation/uncertainty/monte-carlo";
import { buildMonteCarloWorker } from "@/scripts/readiness/monte-carlo-worker.mjs";
import { sideFairing } from "@/tests/support/demo-budgets";

const folder = mkdtempSync(path.join(os.tmpdir(), "leeboard-worker-"));
const workerFile = path.join(folder, "worker.mjs");
const JOB: MonteCarloJob = { state: sideFairing(), operatingPoint: "OP-1", draws: 5000, seed: 77 };
const ENDLESS: MonteCarloJob = { ...JOB, draws: 10_000_000 };

beforeAll(() => buildMonteCarloWorker(workerFile));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe("a run on a thread of its own", () => {
  it("gives what the same draws give in this one, to the last digit, and tells its progress", async () => {
    const told: number[] = [];
    const outcome = await runMonteCarlo(JOB, { workerFile, onProgress: (done) => told.push(done) });
    expect(outcome).toEqual(monteCarlo(JOB.state, "OP-1", { draws: JOB.draws, seed: JOB.seed }));
    expect(told.at(-1)).toBe(JOB.draws);
    expect(told.length).toBeGreaterThan(5);
  });

  it("leaves this thread free to do something else meanwhile", async () => {
    let turns = 0;
    const timer = setInterval(() => (turns += 1), 1);
    await runMonteCarlo(JOB, { workerFile });
    clearInterval(timer);
    expect(turns).toBeGreaterThan(5);
  });

  it("is given up when it takes too long", async () => {
    await expect(runMonteCarlo(ENDLESS, { workerFile, timeoutMs: 300 })).rejects.toThrow("longer than 0.3 s");
  });

  it("is stopped by its signal, before it starts and on the way", async () => {
    const stop = new AbortController();
    const run = runMonteCarlo(ENDLESS, { workerFile, signal: stop.signal, onProgress: () => stop.abort() });
    await expect(run).rejects.toMatchObject({ name: "AbortError" });
    await expect(runMonteCarlo(JOB, { workerFile, signal: stop.signal })).rejects.toMatchObject({ name: "AbortError" });
  });

  it("fails with the fault of its thread, for a job that is none and for a point that is not there", async () => {
    await expect(runMonteCarlo({ ...JOB, draws: 1 }, { workerFile })).rejects.toThrow("draws");
    await expect(runMonteCarlo({ ...JOB, operatingPoint: "OP-9" }, { workerFile })).rejects.toThrow("OP-9");
  });

  it("fails if the thread ends without a result", async () => {
    const silent = path.join(folder, "silent.mjs");
    writeFileSync(silent, "");
    await expect(runMonteCarlo(JOB, { workerFile: silent })).rejects.toThrow("ended with code 0");
  });
});

import { roundStored } from "@/lib/units/rounding";
import { evaluateBudget } from "../budget/evaluate-budget";
import type { BudgetState } from "../lines/line-state";
import { budgetModel, type BudgetModel } from "./budget-model";
import { budgetDrawer } from "./draw-budget";
import { seededStream } from "./xoshiro";

/** Fewer say nothing about the ends of an interval. */
export const FEWEST_DRAWS = 1000;
export const MOST_DRAWS = 10_000_000;
const DRAWS_PER_BATCH = 500;

/** Moments and probabilities of a drawn budget at one operating point. Newtons, 12 significant digits. */
export interface MonteCarloResult {
  operatingPoint: string;
  draws: number;
  seed: number;
  /** Draws that a method refused: left out of everything below. */
  refusedDraws: number;
  basic: { mean: number; standardDeviation: number; low95: number; high95: number };
  predicted: { mean: number; standardDeviation: number };
  basicExceedsLimit: number;
  predictedExceedsLimit: number;
}

export type MonteCarloOutcome = MonteCarloResult | { operatingPoint: string; refused: string[] };

export interface MonteCarloOptions {
  draws: number;
  seed: number;
}

export interface MonteCarloWatch {
  onProgress?: (draws: number) => void;
  /** Asked between batches. */
  cancelled?: () => boolean;
}

/**
 * Propagates the uncertainties of a budget by drawing it many times (JCGM 101:2008, section 7). What items share is drawn
 * once for all of them. The same state, draws and seed give the same answer to the last digit.
 *
 * @returns null if it was cancelled
 * @throws RangeError if the budget has no such operating point, or for an impossible number of draws
 */
export function monteCarlo(
  state: BudgetState,
  operatingPoint: string,
  options: MonteCarloOptions & MonteCarloWatch,
): MonteCarloOutcome | null {
  const batches = monteCarloBatches(state, operatingPoint, options);
  for (let step = batches.next(); ; step = batches.next()) {
    if (step.done) return step.value;
    options.onProgress?.(step.value);
    if (options.cancelled?.()) return null;
  }
}

/** The same in batches: yields how many draws are done, so that who runs it can do something else in between. */
export function* monteCarloBatches(
  state: BudgetState,
  operatingPoint: string,
  options: MonteCarloOptions,
): Generator<number, MonteCarloOutcome, void> {
  const point = evaluateBudget(state).points.find((each) => each.operatingPoint === operatingPoint);
  if (!point) throw new RangeError(`no operating point ${operatingPoint} in force`);
  const model = budgetModel(state, point);
  if ("refused" in model) return { operatingPoint, refused: model.refused };
  return yield* drawModel(model, options);
}

/** Draws a model of a budget in batches. */
export function* drawModel(
  model: BudgetModel,
  { draws, seed }: MonteCarloOptions,
): Generator<number, MonteCarloResult, void> {
  if (!Number.isInteger(draws) || draws < FEWEST_DRAWS || draws > MOST_DRAWS) {
    throw new RangeError(`draws must be a whole number from ${FEWEST_DRAWS} to ${MOST_DRAWS}, got ${draws}`);
  }
  const stream = seededStream(seed);
  const draw = budgetDrawer(model);
  const basic = new Float64Array(draws);
  const predicted = new Float64Array(draws);
  let kept = 0;
  for (let done = 0; done < draws;) {
    for (const end = Math.min(done + DRAWS_PER_BATCH, draws); done < end; done += 1) {
      const totals = draw(stream);
      if (!Number.isFinite(totals.predicted)) continue;
      basic[kept] = totals.basic;
      predicted[kept] = totals.predicted;
      kept += 1;
    }
    yield done;
  }
  if (kept < 2) throw new RangeError(`the methods refused ${draws - kept} of ${draws} draws`);
  return {
    operatingPoint: model.operatingPoint,
    draws,
    seed,
    refusedDraws: draws - kept,
    basic: { ...momentsOf(basic.subarray(0, kept)), ...coveredBy(basic.subarray(0, kept)) },
    predicted: momentsOf(predicted.subarray(0, kept)),
    basicExceedsLimit: roundStored(partAbove(basic.subarray(0, kept), model.limit)),
    predictedExceedsLimit: roundStored(partAbove(predicted.subarray(0, kept), model.limit)),
  };
}

/** Mean and standard deviation in two passes: the square of a sum would lose the digits of a small spread. */
function momentsOf(sample: Float64Array): { mean: number; standardDeviation: number } {
  const mean = sample.reduce((sum, each) => sum + each, 0) / sample.length;
  const squares = sample.reduce((sum, each) => sum + (each - mean) ** 2, 0);
  return { mean: roundStored(mean), standardDeviation: roundStored(Math.sqrt(squares / (sample.length - 1))) };
}

/** The probabilistically symmetric interval: 2.5 % of the draws lie below and as many above (JCGM 101:2008, 7.7). */
function coveredBy(sample: Float64Array): { low95: number; high95: number } {
  const sorted = sample.toSorted();
  const covered = Math.floor(0.95 * sorted.length + 0.5);
  const first = Math.floor((sorted.length - covered) / 2 + 0.5);
  const at = (rank: number): number =>
    roundStored(sorted[Math.min(Math.max(rank, 0), sorted.length - 1)] ?? Number.NaN);
  return { low95: at(first - 1), high95: at(first - 1 + covered) };
}

function partAbove(sample: Float64Array, limit: number): number {
  return sample.reduce((count, each) => count + Number(each > limit), 0) / sample.length;
}

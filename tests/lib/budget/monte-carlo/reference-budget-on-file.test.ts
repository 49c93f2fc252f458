import { expect, it } from "vitest";
import { drawAndKeep } from "@/lib/budget/monte-carlo/draw-and-keep";
import { runsOf } from "@/lib/budget/monte-carlo/runs-of";
import { uncertaintyAt } from "@/lib/budget/uncertainty-at";
import { OWN_UNCERTAINTIES } from "@/lib/evaluation/methods/own-uncertainties";
import { body, CUSTOM, fixed, plate, spread } from "@/tests/lib/evaluation/uncertainty/uncertain-budget";
import { withDatabase } from "@/tests/support/database";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors } from "@/tests/vectors/read-vectors";
import { budgetOnFile, withWorker } from "./budget-to-draw";

withDatabase();
const options = withWorker();

/** The budget of six items of uncertainty.json, with the standard uncertainties of its distributions (GUM 4.3.7, 4.3.9). */
const [VECTOR] = readVectors("uncertainty.json").filter(({ kind }) => kind === "budget_six_items");
if (!VECTOR) throw new Error("the vector of six items is missing");
const EXPECTED = VECTOR.expected;
const NO_STATE = { staticTemperature: null, staticPressure: null };

/** One bias over both bluff bodies, which the vector has not: it adds in squares to the vector's. */
const BLUFF = (EXPECTED.item_nominal_drag_N as number[]).slice(3, 5).reduce((sum, newtons) => sum + newtons, 0);
const BIAS = OWN_UNCERTAINTIES["bluff-body"].relative * BLUFF;
const U = Math.hypot(numberAt(EXPECTED, "sum_gum_shared_inputs_N"), BIAS);

function sixItems(ownerId: number): Record<string, object> {
  const bodies = [
    plate({ value: 3.1 }, { value: 1.15 }, 2),
    plate({ value: 2.2 }, { value: 0.9 }, 1),
    plate({ value: 0.22 }, { value: 0.9 }, 2, { transition: "laminar" }),
    body(1.18, 0.12 / Math.sqrt(3), spread(0.034, 0.0007)),
    body(1.2, 0.15 / Math.sqrt(6), spread(0.011, 0.0003)),
    fixed(spread(0.9, 0.4 / Math.sqrt(3))),
  ];
  return Object.fromEntries(bodies.map((each, index) => [`0${index + 1}0`, { ...each, ownerId }]));
}

it("freezes the reference budget as the vector has it, and draws it within 2 % of that", async () => {
  const { ines } = await budgetOnFile(sixItems, { limit: 4000, point: { ...CUSTOM, ...NO_STATE } });
  const [frozen] = (await uncertaintyAt(ines, "TF-2", "newest"))?.points ?? [];
  if (!frozen || "refused" in frozen) throw new Error("no uncertainty at the point");

  expectRelative(frozen.basic.value, numberAt(EXPECTED, "total_nominal_N"), 1e-8, "total");
  expectRelative(frozen.basic.standardUncertainty, U, 1e-8, "standard uncertainty");
  const shares = EXPECTED.variance_share_by_input as Record<string, number>;
  const speed = frozen.causes.find(({ key }) => key === "operating_point:OP-1:speed");
  const scaled = (shares.speed_m_s ?? Number.NaN) * (numberAt(EXPECTED, "sum_gum_shared_inputs_N") / U) ** 2;
  expectRelative(speed?.share, scaled, 1e-7, "share of the speed");
  const bias = frozen.causes.find(({ key }) => key === "method:bluff-body");
  expectRelative(bias?.share, (BIAS / U) ** 2, 1e-7, "share of the bias");

  const input = { productCode: "TF-2", issue: "newest", operatingPoint: "OP-1", draws: 100_000, seed: 2026 } as const;
  await drawAndKeep(ines, input, () => new Date("2026-03-12T10:00:00.000Z"), options);
  const [run] = await runsOf(ines, "TF-2", 2, "OP-1");
  if (!run) throw new Error("no run");
  const tolerance = numberAt(
    (EXPECTED.tolerance_absolute_for_another_generator_by_sample_size as Record<string, never>)[input.draws] ?? {},
    "mean_N",
  );
  // The bias has mean 1 and is independent: it leaves the exact mean, and widens its error as it widens the deviation.
  const widened = tolerance * (U / numberAt(EXPECTED, "sum_gum_shared_inputs_N"));
  expect(Math.abs(run.result.basic.mean - numberAt(EXPECTED, "exact_mean_N"))).toBeLessThan(widened);
  expectRelative(run.result.basic.standardDeviation, frozen.basic.standardUncertainty, 0.02);
  expectRelative(run.result.predicted.standardDeviation, frozen.predicted.standardUncertainty, 0.02);
  expect(run.result.basic.low95).toBeGreaterThan(frozen.basic.low95 - 0.02 * U);
  expect(Math.abs(run.result.basicExceedsLimit - frozen.basicExceedsLimit)).toBeLessThan(0.02);
}, 60_000);

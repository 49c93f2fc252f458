import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { changedPaths } from "@/lib/evaluation/budget/body-paths";
import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { sameBody } from "@/lib/evaluation/lines/same-body";
import { streamSources } from "@/lib/evaluation/lines/stream-sources";
import { expectRelative } from "@/tests/support/relative";
import { body, budget, modelOf, newtonsOf, uncertaintyOf } from "@/tests/lib/evaluation/uncertainty/uncertain-budget";

const DRY = {
  fluid: "air",
  staticTemperature: { value: 293.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const ITEMS = { "010": body(1, null, { value: 1 }) };

function pointOf(point: object) {
  const [result] = evaluateBudget(budget(ITEMS, { point })).points;
  if (!result) throw new Error("no point");
  return result;
}

function parsedPoint(fields: object) {
  const parsed = parseBody("operating_point", { name: "Cruise", ...DRY, ...fields });
  if (!parsed.ok || parsed.content.kind !== "operating_point") throw new Error("no operating point");
  return parsed.content.body;
}

function faultsOf(fields: object): Record<string, string> {
  const parsed = parseBody("operating_point", { name: "Cruise", ...DRY, ...fields });
  return parsed.ok ? {} : Object.fromEntries(parsed.faults.map(({ path, sentence }) => [path, sentence]));
}

describe("an operating point in humid air", () => {
  it("has the density of CIPM-2007 (293.15 K, 101 325 Pa, half humidity: 1.1993 kg/m³) and so the drag", () => {
    const humid = pointOf({ ...DRY, relativeHumidity: 0.5 });
    expect(humid.stream.density).toBeCloseTo(1.1993, 4);
    expectRelative(humid.totals.basic, 0.5 * humid.stream.density * 25 ** 2, 1e-11);
    expect(humid.totals.basic).toBeLessThan(pointOf(DRY).totals.basic);
  });

  it("is dry where a stored body knows no humidity, which says the same as an empty field", () => {
    const [stored, empty] = [parsedPoint({}), parsedPoint({ relativeHumidity: null, humidityUncertainty: null })];
    expect(stored).toEqual(empty);
    expect(sameBody({ ...DRY }, { ...DRY, relativeHumidity: null })).toBe(true);
    expectRelative(pointOf(DRY).stream.density, 101325 / (287.05287 * 293.15), 1e-12);
  });

  it("takes the temperature and pressure of its altitude", () => {
    const { stream } = pointOf({
      fluid: "air",
      pressureAltitude: { value: 0 },
      speed: { value: 25 },
      relativeHumidity: 1,
    });
    // 288.15 K: saturation 1705 Pa (IAPWS), so an ideal mixture is lighter by 0.378·1705/101325.
    expectRelative(stream.density, 1.225 * (1 - (0.378 * 1705) / 101325), 1e-3);
  });

  it("carries a caution outside 15 to 27 °C or 600 to 1100 hPa, and none inside or where it is dry", () => {
    const codes = (fields: object): string[] =>
      pointOf({ ...DRY, ...fields }).items.flatMap(({ notes }) => notes.map(({ code }) => code));
    const code = "humid-air-outside-range";
    expect(codes({ relativeHumidity: 0.5, staticTemperature: { value: 288.15 } })).not.toContain(code);
    expect(codes({ relativeHumidity: 0.5, staticTemperature: { value: 288.1 } })).toContain(code);
    expect(codes({ relativeHumidity: 0.5, staticTemperature: { value: 300.2 } })).toContain(code);
    expect(codes({ relativeHumidity: 0.5, staticPressure: { value: 5.99e4 } })).toContain(code);
    expect(codes({ staticTemperature: { value: 280 } })).not.toContain(code);
  });

  it("refuses what is no humidity at its own field", () => {
    expect(faultsOf({ relativeHumidity: 0 })).toEqual({});
    expect(faultsOf({ relativeHumidity: 1.01 })).toEqual({ relativeHumidity: "At most 1, which is 100 %." });
    expect(faultsOf({ relativeHumidity: -0.1 })).toEqual({ relativeHumidity: "Must be 0 or greater." });
    expect(faultsOf({ fluid: "fresh-water", staticPressure: null, relativeHumidity: 0.5 })).toEqual({
      relativeHumidity: "Does not belong to this fluid: leave it empty.",
    });
    expect(faultsOf({ staticTemperature: { value: 400 }, relativeHumidity: 1 })).toEqual({
      relativeHumidity: expect.stringMatching(/^At this temperature the vapour alone would exceed the pressure/),
    });
    expect(faultsOf({ humidityUncertainty: 0.02 })).toEqual({
      humidityUncertainty: expect.stringMatching(/^Give the relative humidity too/),
    });
  });

  it("is a row of its sheet and of a difference", () => {
    const now = parsedPoint({ relativeHumidity: 0.5 });
    const rows = fieldRows({ kind: "operating_point", body: now }, { person: () => null, line: () => null });
    expect(rows.find(({ field }) => field === "relativeHumidity")).toMatchObject({ text: "50", unit: "%" });
    expect(changedPaths("operating_point", parsedPoint({}), now)).toEqual(["relativeHumidity"]);
  });

  it("tells its formula where the derived values are shown", () => {
    const density = (fields: object): string =>
      streamSources(parsedPoint(fields)).find(({ symbol }) => symbol === "ρ")?.source ?? "";
    expect(density({ relativeHumidity: 0.5 })).toMatch(/CIPM-2007/);
    expect(density({})).toMatch(/ISO 2533/);
  });

  it("is a cause of uncertainty: 0.3 of humidity is 0.31 % of the density at 20 °C, and draws stay from 0 to 1", () => {
    const state = budget(ITEMS, { point: { ...DRY, relativeHumidity: 0.5, humidityUncertainty: 0.3 } });
    // dρ/dh = −0.378 p_sv/(R_a T) to first order, p_sv = 2339 Pa at 20 °C (IAPWS): −0.0105 kg/m³.
    const slope = (-0.378 * 2339) / (287.05287 * 293.15);
    const key = "operating_point:OP-1:relativeHumidity";
    expectRelative(newtonsOf(uncertaintyOf(state), key), 0.3 * slope * 312.5, 0.02);
    expect(modelOf(state).causes.find((cause) => cause.key === key)).toMatchObject({ lowest: 0, highest: 1 });
  });
});

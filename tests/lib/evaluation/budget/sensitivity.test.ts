import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { reach, sensitivities, type Variable } from "@/lib/evaluation/budget/sensitivity";
import { totalOverSpeed } from "@/lib/evaluation/budget/total-over-speed";
import { budgetState } from "@/tests/support/budget-state";
import { sideFairing, supplyDuct } from "@/tests/support/demo-budgets";

const AIR = {
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const COMMON = { ownerId: 1, grade: "estimated", methodVersion: 1, source: "Test" };
const bluff = {
  ...COMMON,
  name: "Mirror",
  order: 10,
  method: "bluff-body",
  dragCoefficient: 0.5,
  referenceArea: { value: 0.1 },
};
const lamp = { ...COMMON, name: "Lamp", order: 20, method: "fixed", force: { value: 3 } };
const area = { ...COMMON, name: "Post", order: 30, method: "drag-area", dragArea: { value: 0.02 } };

function budget(items: Record<string, object>, point: object = AIR) {
  return budgetState({
    ...{ code: "T-1", name: "Test", kind: "vehicle_fairing" as const, point, items },
    ...{ limitHundredths: 10000, reserveHundredths: 500 },
  });
}

function moves(state: ReturnType<typeof budget>, variable: Variable) {
  const found = sensitivities(state, "OP-1").find((each) => each.variable === variable);
  if (!found) throw new Error(`no ${variable}`);
  return [found.lower, found.higher];
}

/** ρ = p/(R·T) with R = 287.05287 J/(kg·K) (ISO 2533), q = ½ρU²; growth of the grade estimated is 20 %. */
const density = (kelvins: number) => 101325 / (287.05287 * kelvins);
const pressure = 0.5 * density(288.15) * 25 ** 2;
const bodies = 1.2 * pressure * (0.5 * 0.1 + 0.02);

describe("what the predicted total is sensitive to", () => {
  const state = budget({ "010": bluff, "020": lamp, "030": area });

  it("moves with the square of the speed, and a fixed force not at all", () => {
    const [lower, higher] = moves(state, "speed");
    expect(lower).toBeCloseTo(bodies * (0.99 ** 2 - 1), 6);
    expect(higher).toBeCloseTo(bodies * (1.01 ** 2 - 1), 6);
  });

  it("moves with the density of air that is 5 K colder or warmer at the same pressure", () => {
    const [lower, higher] = moves(state, "temperature");
    expect(lower).toBeCloseTo(bodies * (288.15 / 283.15 - 1), 6);
    expect(higher).toBeCloseTo(bodies * (288.15 / 293.15 - 1), 6);
  });

  it("takes the standard atmosphere's temperature where the air is told by its altitude alone", () => {
    // Sea level of ISO 2533 is 288.15 K and 101 325 Pa: the same air.
    const atSea = budget(
      { "010": bluff, "030": area },
      { fluid: "air", pressureAltitude: { value: 0 }, speed: { value: 25 } },
    );
    expect(moves(atSea, "temperature")[1]).toBeCloseTo(bodies * (288.15 / 293.15 - 1), 6);
  });

  it("moves by a tenth of the bluff bodies and drag areas with every C_D", () => {
    const [lower, higher] = moves(state, "drag_coefficient");
    expect(lower).toBeCloseTo(-0.1 * bodies, 6);
    expect(higher).toBeCloseTo(0.1 * bodies, 6);
  });

  it("follows the roughness of a finish and a roughness that an item states", () => {
    const plate = {
      ...COMMON,
      order: 10,
      method: "flat-plate-friction",
      length: { value: 2 },
      breadth: { value: 1 },
      faces: 1,
    };
    const rough = { ...plate, transition: "tripped", frictionLine: "fully-rough" };
    const { source: _, ...own } = { ...rough, name: "Own", roughness: { value: 2e-3 } };
    const { source: __, ...catalogued } = { ...rough, name: "Finish", finish: "F1", order: 20, breadth: { value: 3 } };
    const both = budgetState({
      ...{ code: "T-1", name: "Test", kind: "vehicle_fairing" as const, point: AIR, limitHundredths: 10000 },
      ...{ reserveHundredths: 500, items: { "010": own, "020": catalogued } },
      finishes: { F1: { name: "Coarse", roughness: { value: 2e-3 }, source: "Test" } },
    });
    // Fully rough plate: C_F = (1.89 + 1.62 log10(L/k_s))^−2.5 (Schlichting, Boundary-Layer Theory).
    const coefficient = (roughness: number) => (1.89 + 1.62 * Math.log10(2 / roughness)) ** -2.5;
    const wetted = 2 * 1 + 2 * 3;
    const higher = 1.2 * pressure * wetted * (coefficient(2.2e-3) - coefficient(2e-3));
    expect(moves(both, "roughness")[1]).toBeCloseTo(higher, 6);
  });

  it("ranks them by the greater move, leaves out a temperature that the fluid has not, and changes nothing", () => {
    const custom = budget(
      { "010": bluff },
      { fluid: "custom", density: { value: 1.2 }, dynamicViscosity: { value: 1.8e-5 }, speed: { value: 25 } },
    );
    expect(sensitivities(custom, "OP-1").map(({ variable }) => variable)).toEqual([
      "drag_coefficient",
      "speed",
      "roughness",
    ]);
    for (const demo of [sideFairing(), supplyDuct()]) {
      const before = JSON.stringify(demo);
      const reaches = sensitivities(demo, "OP-1").map(reach);
      expect(reaches).toEqual(reaches.toSorted((one, other) => other - one));
      expect(JSON.stringify(demo)).toBe(before);
    }
  });

  it("gives none where an item is refused: a total in which one is missing is none", () => {
    const circle = {
      ...COMMON,
      order: 40,
      method: "share",
      fraction: 0.1,
      ofGroup: null,
      includeSavings: false,
      name: "Gaps",
    };
    const refused = budget({ "010": bluff, "040": { ...circle, of: ["050"] }, "050": { ...circle, of: ["040"] } });
    expect(sensitivities(refused, "OP-1")).toEqual([]);
    expect(totalOverSpeed(refused, "OP-1", 3).map(({ totals }) => totals)).toEqual([null, null, null]);
  });
});

describe("the total over speed", () => {
  it("runs from half the speed to half as much again, with the square of it for bluff bodies", () => {
    const points = totalOverSpeed(budget({ "010": bluff, "030": area }), "OP-1", 5);
    expect(points.map(({ speed }) => speed)).toEqual([12.5, 18.75, 25, 31.25, 37.5]);
    points.forEach(({ speed, totals }) => {
      expect(totals?.predicted).toBeCloseTo(bodies * (speed / 25) ** 2, 6);
      expect(totals?.basic).toBeCloseTo((bodies / 1.2) * (speed / 25) ** 2, 6);
    });
  });

  it("passes through the evaluated total at the speed of the operating point", () => {
    const demo = sideFairing();
    const own = evaluateBudget(demo).points[0]?.totals.predicted;
    expect(totalOverSpeed(demo, "OP-1", 3)[1]?.totals?.predicted).toBeCloseTo(own ?? NaN, 9);
  });
});

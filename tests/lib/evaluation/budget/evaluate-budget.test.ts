import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { ItemResult } from "@/lib/evaluation/budget/results";
import { budgetState } from "@/tests/support/budget-state";

const AIR = {
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const COMMON = { ownerId: 1, grade: "estimated", methodVersion: 1, source: "judgement" };

function fixed(newtons: number, more: object = {}) {
  return { ...COMMON, name: "fixed", order: 10, method: "fixed", force: { value: newtons }, ...more };
}

function share(fraction: number, more: object) {
  return { ...COMMON, name: "share", order: 90, method: "share", fraction, ...more };
}

function plate(more: object = {}) {
  const { source: _, ...common } = COMMON;
  return {
    ...common,
    name: "plate",
    order: 10,
    method: "flat-plate-friction",
    length: { value: 2.4 },
    breadth: { value: 0.95 },
    faces: 2,
    roughness: { value: 0 },
    transition: "tripped",
    frictionLine: "prandtl-schlichting",
    ...more,
  };
}

function evaluated(sketch: { items: Record<string, object> } & Record<string, unknown>) {
  return evaluateBudget(
    budgetState({
      code: "T-1",
      name: "Test",
      kind: "vehicle_fairing",
      point: AIR,
      limitHundredths: 10000,
      reserveHundredths: 500,
      ...sketch,
    }),
  );
}

function result(results: ReturnType<typeof evaluated>, item: string): ItemResult {
  const found = results.points[0]?.items.find((each) => each.item === item);
  if (!found) throw new Error(`no result of ${item}`);
  return found;
}

describe("a share", () => {
  const groups = { G10: { name: "Cab", order: 10 }, G20: { name: "Roof", parent: "G10", order: 20 } };

  it("takes its fraction of the basic estimates of its members, not of their growth", () => {
    const results = evaluated({
      items: { "010": fixed(8), "020": fixed(4), "090": share(0.05, { of: ["010", "020"] }) },
    });
    expect(result(results, "090")).toMatchObject({ basic: 0.6, growth: 0.12, predicted: 0.72 });
  });

  it("of a group means with its subgroups, and without savings unless it asks for them", () => {
    const items = {
      "010": fixed(8, { group: "G10" }),
      "020": fixed(4, { group: "G20" }),
      "030": fixed(-2, { group: "G20", saving: true }),
      "040": fixed(100),
    };
    const without = evaluated({ groups, items: { ...items, "090": share(0.1, { ofGroup: "G10" }) } });
    expect(result(without, "090").basic).toBe(1.2);
    const withSavings = evaluated({
      groups,
      items: { ...items, "090": share(0.1, { ofGroup: "G10", includeSavings: true }) },
    });
    expect(result(withSavings, "090").basic).toBe(1);
  });

  it("of a share follows that share", () => {
    const results = evaluated({
      items: { "010": fixed(8), "080": share(0.5, { of: ["010"] }), "090": share(0.5, { of: ["080"] }) },
    });
    expect(result(results, "090").basic).toBe(2);
  });

  it("that stands in the group it names, or names itself through another, is refused as a circle", () => {
    const inGroup = evaluated({ groups, items: { "090": share(0.1, { ofGroup: "G10", group: "G20" }) } });
    expect(result(inGroup, "090").refused?.code).toBe("share-circle");
    const ring = evaluated({ items: { "080": share(0.1, { of: ["090"] }), "090": share(0.1, { of: ["080"] }) } });
    expect(result(ring, "080").refused?.code).toBe("share-circle");
    expect(result(ring, "090").refused?.code).toBe("share-circle");
  });

  it("of a refused item is refused too, and counts in no total", () => {
    const tiny = plate({ length: { value: 1e-6 } });
    const results = evaluated({ items: { "010": tiny, "020": fixed(5), "090": share(0.1, { of: ["010"] }) } });
    expect(result(results, "010").refused?.code).toBe("reynolds-outside-every-line");
    expect(result(results, "090").refused?.code).toBe("share-of-refused");
    expect(results.points[0]?.totals.basic).toBe(5);
  });
});

describe("growth", () => {
  it("shrinks a saving, and totals are given without savings too", () => {
    const results = evaluated({ items: { "010": fixed(10), "020": fixed(-4, { saving: true }) } });
    expect(result(results, "020")).toMatchObject({ basic: -4, growth: 0.8, predicted: -3.2 });
    expect(results.points[0]?.totals).toMatchObject({
      basic: 6,
      growth: 2.8,
      predicted: 8.8,
      predictedWithoutSavings: 12,
    });
  });
});

describe("a plate that lies behind another", () => {
  it("takes that plate's run-up and length for its own, so that the two add up to one plate", () => {
    const one = evaluated({ items: { "010": plate({ length: { value: 6 } }) } });
    const parts = evaluated({
      items: {
        "010": plate({ length: { value: 2.4 } }),
        "020": plate({ length: { value: 2.1 }, liesBehind: "010", runUpFollows: true }),
        "030": plate({ length: { value: 1.5 }, liesBehind: "020", runUpFollows: true }),
      },
    });
    expect(parts.points[0]?.totals.basic).toBeCloseTo(one.points[0]?.totals.basic ?? NaN, 9);
  });

  it("keeps a typed run-up where it doesn't follow, and is noted where it claims a fresh leading edge", () => {
    const results = evaluated({
      items: {
        "010": plate(),
        "020": plate({ length: { value: 1 }, liesBehind: "010", runUp: { value: 2.4 } }),
        "030": plate({ length: { value: 1.1 }, liesBehind: "010" }),
        "040": plate({ length: { value: 1.1 } }),
      },
    });
    const codes = (item: string) => result(results, item).notes.map(({ code }) => code);
    expect(codes("020")).not.toContain("fresh-leading-edge-behind");
    expect(codes("030")).toContain("fresh-leading-edge-behind");
    expect(codes("040")).not.toContain("fresh-leading-edge-behind");
    expect(result(results, "030").basic).toBe(result(results, "040").basic);
  });
});

describe("two plates in one place", () => {
  it("are both noted as perhaps one surface, unless anything that places them differs", () => {
    const noted = (other: object) => {
      const results = evaluated({ items: { "010": plate(), "020": plate(other) } });
      return ["010", "020"].map((item) =>
        result(results, item).notes.some(({ code }) => code === "same-surface-twice"),
      );
    };
    expect(noted({})).toEqual([true, true]);
    expect(noted({ localSpeedRatio: 0.9 })).toEqual([false, false]);
    expect(noted({ breadth: { value: 0.96 } })).toEqual([false, false]);
  });
});

describe("a finish from the catalogue", () => {
  it("gives the item its roughness", () => {
    const rough = { frictionLine: "fully-rough", transition: "tripped" };
    const catalogue = { F10: { name: "galvanised", roughness: { value: 1.5e-4 }, source: "judgement" } };
    const results = evaluated({
      finishes: catalogue,
      items: {
        "010": plate({ ...rough, roughness: null, finish: "F10" }),
        "020": plate({ ...rough, roughness: { value: 1.5e-4 } }),
      },
    });
    expect(result(results, "010").basic).toBe(result(results, "020").basic);
    expect(result(results, "010").basic).toBeGreaterThan(0);
  });
});

describe("a duct", () => {
  const duct = { kind: "duct", terms: { flowArea: { value: 3 } } };
  const loss = { ...COMMON, name: "loss", order: 10, method: "loss-coefficient", lossCoefficient: 0.2 };

  it("counts pressure losses on its own flow area whatever the item's section, so that pascals add up", () => {
    const { source: _, ...common } = COMMON;
    const entry = {
      ...common,
      name: "entry",
      order: 20,
      method: "duct-entry",
      width: { value: 1 },
      height: { value: 0.8 },
      length: { value: 4 },
      roughness: { value: 0 },
    };
    const results = evaluated({ ...duct, items: { "010": { ...loss, flowArea: { value: 0.5 } }, "020": entry } });
    for (const item of ["010", "020"]) {
      const { basic, answer } = result(results, item);
      expect(basic).toBeCloseTo((answer?.pressureLoss ?? NaN) * 3, 9);
    }
  });

  it("elsewhere counts a loss on the item's own area", () => {
    const results = evaluated({ items: { "010": { ...loss, flowArea: { value: 0.5 } } } });
    const { basic, answer } = result(results, "010");
    expect(basic).toBeCloseTo((answer?.pressureLoss ?? NaN) * 0.5, 9);
  });
});

describe("limits, reserves and standings", () => {
  const otherPoints = {
    "OP-2": { ...AIR, name: "own limit", limitHundredths: 5000 },
    "OP-3": { ...AIR, name: "no limit of its own" },
  };

  it("an empty limit is the reference point's, and a reserve that isn't given scales with the limit", () => {
    const { points } = evaluated({ otherPoints, items: { "010": fixed(10) } });
    expect(points.map(({ limitHundredths, reserveHundredths }) => [limitHundredths, reserveHundredths])).toEqual([
      [10000, 500],
      [5000, 250],
      [10000, 500],
    ]);
  });

  it("a reserve that is given holds", () => {
    const reserves = [
      { operatingPoint: "OP-1", hundredths: 500 },
      { operatingPoint: "OP-2", hundredths: 40 },
    ];
    const { points } = evaluated({ otherPoints, terms: { reserves }, items: { "010": fixed(10) } });
    expect(points[1]?.reserveHundredths).toBe(40);
  });

  // Limit 100.00 N, reserve 5.00 N, a measured item without growth.
  it.each([
    [95, "inside"],
    [95.004, "inside"],
    [95.006, "into_the_reserve"],
    [100, "into_the_reserve"],
    [100.004, "into_the_reserve"],
    [100.006, "over"],
  ])("%d N stands %s, decided on values rounded to 0.01 N", (newtons, standing) => {
    const evidence = [{ document: "Report", revision: "1", date: "2026-01-01" }];
    const { points } = evaluated({ items: { "010": fixed(newtons, { grade: "measured_actual", evidence }) } });
    expect(points[0]?.standing).toBe(standing);
  });

  it("the worst point is the one that stands worst, not the one with the least newtons left", () => {
    const results = evaluated({ otherPoints, items: { "010": fixed(45) } });
    expect(results.points.map(({ standing }) => standing)).toEqual(["inside", "over", "inside"]);
    expect(results.worstPoint).toBe("OP-2");
  });
});

describe("what an evaluation keeps", () => {
  it("has every number at twelve significant digits, notes and answers too", () => {
    const results = evaluated({ items: { "010": plate({ frictionLine: "one-fifth-law", length: { value: 9 } }) } });
    const numbers: number[] = [];
    const collect = (value: unknown): void => {
      if (typeof value === "number") numbers.push(value);
      else if (typeof value === "object" && value !== null) Object.values(value).forEach(collect);
    };
    collect(result(results, "010"));
    expect(numbers.length).toBeGreaterThan(15);
    expect(numbers.filter((value) => value !== Number(value.toPrecision(12)))).toEqual([]);
  });

  it("stands in the order of the sheet: groups where their order puts them, what they hold below", () => {
    const results = evaluated({
      groups: { G10: { name: "Cab", order: 20 }, G20: { name: "Roof", parent: "G10", order: 5 } },
      items: {
        "040": fixed(1, { order: 30 }),
        "030": fixed(1, { order: 10 }),
        "020": fixed(1, { order: 10, group: "G10" }),
        "010": fixed(1, { order: 99, group: "G20" }),
      },
    });
    expect(results.points[0]?.items.map(({ item }) => item)).toEqual(["030", "010", "020", "040"]);
  });

  it("is refused where the terms name a version nobody knows", () => {
    expect(() => evaluated({ terms: { rollUpVersion: 7 }, items: { "010": fixed(1) } })).toThrow(RangeError);
  });
});

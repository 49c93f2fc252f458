import { describe, expect, it } from "vitest";
import { withMethod } from "@/app/_components/line-fields/new-edit";
import { dragOf, newtonsFrom, percentFrom } from "@/app/(workspace)/trial/_trial/difference";
import { readSetting } from "@/app/(workspace)/trial/_trial/read-setting";
import {
  exampleTrial,
  itemFields,
  pointFields,
  Trial,
  type TrialSetting,
} from "@/app/(workspace)/trial/_trial/setting";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";

/** Water-like: q = ½ · 1000 · 2² = 2000 Pa. */
const STREAM = {
  ...exampleTrial().a.point,
  fluid: "custom",
  staticTemperature: null,
  staticPressure: null,
  density: { value: 1000 },
  dynamicViscosity: { value: 1e-3 },
  speed: { value: 2 },
};

function settingOf(method: string, fields: TrialSetting["item"], membersSum: TrialSetting["membersSum"] = null) {
  return { point: STREAM, item: { ...withMethod(exampleTrial().a.item, method, null), ...fields }, membersSum };
}

describe("a setting of a trial", () => {
  it("is computed from the start, both sides of the example", () => {
    const { a, b } = exampleTrial();

    expect(readSetting(a).faults).toEqual([]);
    expect(dragOf(readSetting(b))).toBeGreaterThan(dragOf(readSetting(a)) ?? Infinity);
  });

  it.each([
    // By hand: D = q · C_D · A, q · (C_D A), K q A, the force itself, force · q/q_test, share · ΣB.
    ["bluff-body", { dragCoefficient: 1.2, referenceArea: { value: 0.5 } }, null, 1200],
    ["drag-area", { dragArea: { value: 0.06 } }, null, 120],
    ["loss-coefficient", { lossCoefficient: 0.5, flowArea: { value: 0.1 } }, null, 100],
    ["fixed", { force: { value: 12.5 } }, null, 12.5],
    [
      "measured",
      {
        force: { value: 10 },
        testFluid: "custom",
        testDensity: { value: 1000 },
        testDynamicViscosity: { value: 1e-3 },
        testSpeed: { value: 1 },
      },
      null,
      40,
    ],
    ["share", { fraction: 0.2 }, { value: 60 }, 12],
  ] as const)("gives the drag of %s as by hand", (method, fields, membersSum, drag) => {
    const reading = readSetting(settingOf(method, { ...fields }, membersSum));

    expect(reading.faults).toEqual([]);
    expect(dragOf(reading)).toBeCloseTo(drag, 9);
    expect(reading.result?.steps.at(-1)?.value).toBeCloseTo(drag, 9);
  });

  it("gives the laminar friction of a plate as Blasius has it: D = q · b · L · 1.328/√Re", () => {
    const fields = { length: { value: 0.1 }, breadth: { value: 1 }, finish: null, roughness: { value: 0 } };
    const reading = readSetting(settingOf("flat-plate-friction", fields));

    expect(dragOf(reading)).toBeCloseTo((2000 * 1 * 0.1 * 1.328) / Math.sqrt(2e5), 9);
    expect(reading.result?.alternates?.lines.length).toBeGreaterThan(1);
  });

  it.each(METHOD_NAMES)("says at fields of its form what %s still needs", (method) => {
    const fresh = settingOf(method, {});
    const bare = { ...fresh, item: { ...withMethod({}, method, null) } };
    const { result, faults } = readSetting(bare);
    const onForm = [
      ...itemFields(bare.item).map(({ key }) => `item.${key}`),
      ...pointFields(bare.point).map(({ key }) => `point.${key}`),
      "membersSum",
    ];

    expect(result).toBeNull();
    expect(faults.length).toBeGreaterThan(0);
    for (const { path } of faults) expect(onForm).toContain(path);
  });

  it("tells a fault of the stream, an unread text and a finish that a rough line can't take at their fields", () => {
    const { a } = exampleTrial();
    const cold = { ...a, point: { ...a.point, staticTemperature: { value: 20, entered: "20 K" } } };
    const unread = { ...a, item: { ...a.item, length: { entered: "4 apples" } } };
    const loss = settingOf("loss-coefficient", { lossCoefficient: 1, flowArea: null });

    expect(readSetting(cold).faults.map(({ path }) => path)).toEqual(["point.staticTemperature"]);
    expect(readSetting(unread).faults.map(({ path }) => path)).toEqual(["item.length"]);
    expect(readSetting(loss).faults).toEqual([
      { path: "item.flowArea", sentence: "Give the flow area: the product has none." },
    ]);
  });

  it("shows a refusal of the method as its outcome, without a drag", () => {
    const fields = { length: { value: 1e-6 }, breadth: { value: 1 }, finish: null, roughness: { value: 0 } };
    const reading = readSetting(settingOf("flat-plate-friction", fields));

    expect(reading.result?.outcome).toMatchObject({
      outcome: "refused",
      note: { code: "reynolds-outside-every-line" },
    });
    expect(dragOf(reading)).toBeNull();
  });

  it("comes back from what the tab keeps as it was", () => {
    const trial = exampleTrial();

    expect(Trial.parse(JSON.parse(JSON.stringify(trial)))).toEqual(trial);
  });
});

describe("the difference from A to B", () => {
  it("is told in newtons and in per cent of A, with its sign", () => {
    expect(newtonsFrom(10, 10.4)).toBe("+0.40\u2009N");
    expect(percentFrom(10, 10.4)).toBe("+4.0\u2009%");
    expect(newtonsFrom(10, 9)).toBe("−1.00\u2009N");
    expect(percentFrom(10, 9)).toBe("−10.0\u2009%");
  });

  it("counts from a saving by its size, and has no per cent of nothing", () => {
    expect(percentFrom(-10, -12)).toBe("−20.0\u2009%");
    expect(percentFrom(0, 4)).toBeNull();
    expect(newtonsFrom(null, 4)).toBeNull();
  });
});

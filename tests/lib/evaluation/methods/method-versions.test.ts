import { describe, expect, it } from "vitest";
import { MethodInput, StreamPointInput } from "@/lib/evaluation/document/schema";
import { alternateLines } from "@/lib/evaluation/methods/alternate-lines";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { METHOD_VERSIONS, METHODS_WITH_VERSIONS, newestVersionOf } from "@/lib/evaluation/methods/method-versions";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { workedSteps } from "@/lib/evaluation/methods/worked-steps";
import { itemForce } from "@/lib/evaluation/uncertainty/item-force";
import { AIR } from "./evaluate-one";

const POINT = StreamPointInput.parse({ ...AIR, speed: 25 });
const STREAM = streamStateOf(POINT);

function plate(frictionLine: string) {
  const surface = { length: 2.4, breadth: 0.95, faces: 2, frictionLine, transition: { kind: "tripped" } };
  return MethodInput.parse({ method: "flat-plate-friction", ...surface });
}
const DUCT = MethodInput.parse({
  ...{ method: "duct-entry", width: 0.6, height: 0.4, length: 2, frictionLine: "one-fifth-law" },
  transition: { kind: "tripped" },
});

function dragOf(version: number, input: MethodInput): number {
  const outcome = evaluateMethod(input.method, version, input, STREAM);
  if (outcome.outcome === "refused") throw new Error("refused");
  return outcome.answer.drag;
}

describe("the published versions of the methods", () => {
  it("are numbered 1, 2, 3 for every method, and flat plates and duct entries have two", () => {
    for (const method of METHOD_NAMES) {
      expect(METHOD_VERSIONS[method].map(({ version }) => version)).toEqual(
        METHOD_VERSIONS[method].map((_, at) => at + 1),
      );
      expect(newestVersionOf(method)).toBe(METHOD_VERSIONS[method].length);
    }
    expect(METHODS_WITH_VERSIONS).toEqual(["flat-plate-friction", "duct-entry"]);
  });

  it("differ by the constants of the one-fifth law alone: 0.074 in the first, 0.072 in the second", () => {
    // q · faces · L · B · C_F, C_F = c Re^(−1/5), from the printed constants.
    const reynolds = (STREAM.speed * 2.4) / STREAM.kinematicViscosity;
    const byHand = (constant: number) => STREAM.dynamicPressure * 2 * 2.4 * 0.95 * constant * reynolds ** -0.2;
    expect(dragOf(1, plate("one-fifth-law"))).toBeCloseTo(byHand(0.074), 9);
    expect(dragOf(2, plate("one-fifth-law"))).toBeCloseTo(byHand(0.072), 9);
    expect(dragOf(2, DUCT) / dragOf(1, DUCT)).toBeCloseTo(0.072 / 0.074, 12);
    for (const line of ["automatic", "prandtl-schlichting", "white", "momentum-integral"]) {
      expect(dragOf(2, plate(line))).toBe(dragOf(1, plate(line)));
    }
  });

  it.each([1, 2])("give one drag in the answer, the worked steps and the draws, in version %d", (version) => {
    for (const input of [plate("one-fifth-law"), DUCT]) {
      const drag = dragOf(version, input);
      expect(workedSteps(input.method, version, input, POINT).at(-1)?.value).toBeCloseTo(drag, 9);
      expect(itemForce(version, input, null).newtons(STREAM)).toBeCloseTo(drag, 9);
    }
    const text = workedSteps("flat-plate-friction", version, plate("one-fifth-law"), POINT).map(
      ({ formula }) => formula,
    );
    expect(text.join(" ")).toContain(version === 1 ? "0.074 Re^(−1/5)" : "0.072 Re^(−1/5)");
  });

  it("stand beside other lines by their own constants", () => {
    const own = alternateLines(2, plate("one-fifth-law"), STREAM)?.lines.find(({ isItemsOwn }) => isItemsOwn);
    expect(own?.drag).toBe(dragOf(2, plate("one-fifth-law")));
    expect(own?.title).toContain("momentum integral");
  });

  it("have no third: that is a fault of the program", () => {
    expect(() => dragOf(3, plate("one-fifth-law"))).toThrow("no method flat-plate-friction of version 3");
    expect(() => itemForce(3, plate("one-fifth-law"), null)).toThrow("of version 3");
  });
});

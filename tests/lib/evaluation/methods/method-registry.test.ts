import { describe, expect, it } from "vitest";
import { MethodInput, StreamPointInput } from "@/lib/evaluation/document/schema";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { METHOD_VERSIONS } from "@/lib/evaluation/methods/method-versions";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { AIR, PLAIN } from "./evaluate-one";

const STREAM = streamStateOf(StreamPointInput.parse(PLAIN));
const FIXED = MethodInput.parse({ method: "fixed", force: 2 });

describe("the registry of methods", () => {
  it("has published versions of every method, and of all but share an evaluator of each", () => {
    expect(Object.keys(METHOD_VERSIONS).sort()).toEqual([...METHOD_NAMES].sort());
    for (const method of METHOD_NAMES.filter((name) => name !== "share" && name !== "fixed")) {
      for (const { version } of METHOD_VERSIONS[method]) {
        expect(() => evaluateMethod(method, version, FIXED, STREAM)).toThrow(`input of fixed given to ${method}`);
      }
    }
    expect(evaluateMethod("fixed", 1, FIXED, STREAM)).toEqual({
      outcome: "answer",
      answer: { drag: 2, notes: [] },
    });
  });

  it("takes an unknown version, a share by itself and another method's input for faults of the program", () => {
    const share = MethodInput.parse({ method: "share", fraction: 0.1, of: ["a"] });
    expect(() => evaluateMethod("fixed", 99, FIXED, STREAM)).toThrow("no method fixed of version 99");
    expect(() => evaluateMethod("share", 1, share, STREAM)).toThrow("no method share of version 1");
    expect(() => evaluateMethod("bluff-body", 1, FIXED, STREAM)).toThrow("input of fixed given to bluff-body");
  });
});

describe("the stream of an operating point", () => {
  it("takes the standard pressure with a temperature of its own at an altitude", () => {
    const { staticTemperature, staticPressure, ...rest } = AIR;
    const standard = streamStateOf(StreamPointInput.parse({ ...rest, pressureAltitude: 0 }));
    expect(standard).toEqual(streamStateOf(StreamPointInput.parse(AIR)));
    const warm = streamStateOf(StreamPointInput.parse({ ...rest, pressureAltitude: 0, staticTemperature: 308.15 }));
    expect(warm.density * 308.15).toBeCloseTo(standard.density * staticTemperature, 9);
    expect(staticPressure).toBe(101325);
  });

  it("has a speed of sound in air alone", () => {
    expect(streamStateOf(StreamPointInput.parse(AIR)).speedOfSound).toBeCloseTo(340.294, 3);
    for (const fluid of ["fresh-water", "sea-water"]) {
      const stream = streamStateOf(StreamPointInput.parse({ fluid, staticTemperature: 288.15, speed: 2 }));
      expect(stream.speedOfSound).toBeUndefined();
      expect(stream.dynamicPressure).toBeCloseTo(2 * stream.density, 9);
    }
  });
});

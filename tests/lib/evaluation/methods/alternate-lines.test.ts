import { describe, expect, it } from "vitest";
import { MethodInput, StreamPointInput } from "@/lib/evaluation/document/schema";
import { alternateLines } from "@/lib/evaluation/methods/alternate-lines";
import { layerStretches } from "@/lib/evaluation/methods/layer-stretches";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { expectRelative } from "@/tests/support/relative";
import { answerOf, PLAIN } from "./evaluate-one";

const STREAM = streamStateOf(StreamPointInput.parse(PLAIN));
const plate = (fields: object) =>
  MethodInput.parse({ method: "flat-plate-friction", length: 2, breadth: 1, faces: 1, ...fields });

describe("friction lines side by side", () => {
  it("are those whose range holds this Re, the item's own among them", () => {
    const result = alternateLines(1, plate({ frictionLine: "white" }), STREAM);
    const names = result?.lines.map(({ line }) => line);
    expect(names).toContain("schultz-grunow");
    expect(names).not.toContain("fully-rough"); // no roughness to be rough with
    expect(result?.lines.filter(({ isItemsOwn }) => isItemsOwn).map(({ line }) => line)).toEqual(["white"]);
    const low = alternateLines(1, plate({ frictionLine: "white", length: 0.7 }), STREAM)?.lines.map(({ line }) => line);
    expect(low).not.toContain("schultz-grunow");
    expect(low).not.toContain("momentum-integral");
  });

  it("show the difference from the item's own drag and the spread of those that fit its surface", () => {
    const result = alternateLines(1, plate({ frictionLine: "white", roughness: 1e-4 * 0.5 }), STREAM);
    const own = answerOf(PLAIN, { ...plate({ frictionLine: "white", roughness: 1e-4 * 0.5 }) }).drag;
    for (const { line, drag, difference } of result?.lines ?? []) {
      expectRelative(drag, answerOf(PLAIN, { ...plate({ frictionLine: line, roughness: 1e-4 * 0.5 }) }).drag, 1e-14);
      expect(difference).toBeCloseTo(drag / own - 1, 12);
    }
    const fitting = (result?.lines ?? []).filter(({ fitsSurface }) => fitsSurface);
    expect(fitting.map(({ line }) => line)).not.toContain("fully-rough");
    const drags = fitting.map(({ drag }) => drag);
    expect(result?.spread).toBeCloseTo((Math.max(...drags) - Math.min(...drags)) / own, 12);
  });

  it("keep the item's own line even outside its range, and are none for other methods", () => {
    const own = alternateLines(1, plate({ frictionLine: "one-fifth-law", length: 50 }), STREAM);
    expect(own?.lines.find(({ isItemsOwn }) => isItemsOwn)?.line).toBe("one-fifth-law");
    expect(alternateLines(1, MethodInput.parse({ method: "fixed", force: 1 }), STREAM)).toBeNull();
    expect(alternateLines(1, plate({ length: 1e6 }), STREAM)).toBeNull();
  });
});

describe("regime by stretch", () => {
  it.each<[object, object[]]>([
    [
      {},
      [
        { from: 0, to: 0.5, regime: "laminar" },
        { from: 0.5, to: 2, regime: "turbulent" },
      ],
    ],
    [
      { runUp: 0.2 },
      [
        { from: 0.2, to: 0.5, regime: "laminar" },
        { from: 0.5, to: 2.2, regime: "turbulent" },
      ],
    ],
    [{ runUp: 0.8 }, [{ from: 0.8, to: 2.8, regime: "turbulent" }]],
    [{ transition: { kind: "laminar" } }, [{ from: 0, to: 2, regime: "laminar" }]],
    [{ transition: { kind: "tripped", at: 0 } }, [{ from: 0, to: 2, regime: "turbulent" }]],
    [{ roughness: 1e-3 }, [{ from: 0, to: 2, regime: "turbulent" }]],
    [{ length: 0.4 }, [{ from: 0, to: 0.4, regime: "laminar" }]],
  ])("%o", (fields, stretches) => {
    const found = layerStretches(1, plate(fields), STREAM);
    expect(found.map(({ regime }) => regime)).toEqual(
      stretches.map((stretch) => "regime" in stretch && stretch.regime),
    );
    found.forEach(({ from, to }, index) => expect({ from, to }).toMatchObject(closeTo(stretches[index] ?? {})));
  });

  it("is none for other methods", () => {
    expect(layerStretches(1, MethodInput.parse({ method: "fixed", force: 1 }), STREAM)).toEqual([]);
  });
});

function closeTo(stretch: object): object {
  return Object.fromEntries(
    Object.entries(stretch).flatMap(([key, value]) =>
      typeof value === "number" ? [[key, expect.closeTo(value, 10)]] : [],
    ),
  );
}

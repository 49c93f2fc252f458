import { describe, expect, it } from "vitest";
import { withoutHidden } from "@/lib/evaluation/lines/field-rows";
import { namedFault } from "@/lib/evaluation/lines/named-fault";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { parseBody } from "@/lib/evaluation/lines/parse-body";

const PLATE = { method: "flat-plate-friction", evidence: [{}] };
const EDITS = [
  { kind: "operating_point" as const, number: "OP-1", body: newOperatingPoint() },
  { kind: "item" as const, number: "030", body: PLATE },
  { kind: "item" as const, number: "", body: PLATE },
  { kind: "group" as const, number: "G10", body: null },
];
const POSITIVE = "Must be greater than 0.";

describe("a fault told away from its field", () => {
  it.each([
    ["edits.1.body.length", "Item 030, Length along the flow: Must be greater than 0."],
    ["edits.0.body.speed", "Operating point OP-1, Speed: Must be greater than 0."],
    ["edits.1.body.evidence.0.date", "Item 030, Evidence, Citation 1, Date: Must be greater than 0."],
    ["edits.2.body.length", "Item without a number, Length along the flow: Must be greater than 0."],
    ["edits.3", "Group G10: Must be greater than 0."],
    ["transfers.0.hundredths", POSITIVE],
  ])("at %s names its line and field", (path, text) => {
    expect(namedFault(EDITS, { path, sentence: POSITIVE })).toBe(text);
  });

  it("is left alone where it names the line by itself", () => {
    const sentence = "Item 030 lies behind itself.";
    expect(namedFault(EDITS, { path: "edits.1.body.liesBehind", sentence })).toBe(sentence);
  });
});

describe("a choice that hides fields", () => {
  it("empties them, so that air's pressure does not stand in water's way unseen", () => {
    const air = { ...newOperatingPoint(), name: "Tank", speed: { value: 2 }, relativeHumidity: 0.5 };
    const water = withoutHidden("operating_point", { ...air, fluid: "fresh-water" });
    expect(water).toMatchObject({ staticPressure: null, relativeHumidity: null, staticTemperature: { value: 288.15 } });
    expect(parseBody("operating_point", water).ok).toBe(true);
  });

  it("keeps what has a meaning of its own whether it is shown or not", () => {
    const plate = {
      method: "flat-plate-friction",
      transition: "laminar",
      trippedAt: { value: 1 },
      finish: "F10",
      roughness: { value: 1e-6 },
    };
    expect(withoutHidden("item", plate)).toEqual({ ...plate, roughness: null });
  });
});

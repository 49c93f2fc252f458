import { describe, expect, it } from "vitest";

import { quantityReading, quantityText } from "@/app/_components/quantity-reading";

describe("what a quantity field reads", () => {
  it("reads feet as metres by the international foot of 0.3048 m", () => {
    const reading = quantityReading("27 ft", "length");

    expect(reading).toMatchObject({ state: "read" });
    if (reading.state === "read") expect(reading.value).toBeCloseTo(27 * 0.3048, 12);
  });

  it("shows the value in the unit of its dimension beside what was typed", () => {
    expect(quantityReading("90 km/h", "speed")).toMatchObject({ state: "read", text: "25\u2009m/s" });
  });

  it("takes an empty field for empty, not for wrong", () => {
    expect(quantityReading("   ", "length")).toEqual({ state: "empty" });
  });

  it("says what is needed where the unit measures something else", () => {
    const reading = quantityReading("3 kg", "length");

    expect(reading.state).toBe("unread");
    if (reading.state === "unread") expect(reading.sentence).toContain("a length is needed, for example 8.2 m");
  });

  it("opens a field with the text as it was typed, so that nothing typed is lost", () => {
    expect(quantityText({ value: 8.2296, entered: "27 ft" }, "length")).toBe("27 ft");
  });

  it("opens a field for a value without typed text so that it reads back to the same value", () => {
    for (const value of [0.0000415, 0.6, 8.2, 1234.5]) {
      expect(quantityReading(quantityText({ value }, "length"), "length")).toMatchObject({ state: "read", value });
    }
  });
});

import { describe, expect, it } from "vitest";
import { placeDimensions } from "@/app/(workspace)/products/[productCode]/_pictures/dimension-rows";

const scale = { min: 0, max: 100 };
const dimension = (from: number, to: number) => ({ from, to, value: "", word: `${from}-${to}` });

describe("the labels of dimension lines", () => {
  it("stand on a long line and below a short one that follows it", () => {
    expect(placeDimensions(scale, [dimension(0, 80), dimension(80, 90)]).map(({ label }) => label)).toEqual([
      "on",
      "below-end",
    ]);
  });

  it("stand right of the last short line where there is room", () => {
    expect(placeDimensions(scale, [dimension(0, 20), dimension(20, 25)]).map(({ label }) => label)).toEqual([
      "below-start",
      "right",
    ]);
  });

  it("have arrowheads outside where the span is too short for two of them", () => {
    expect(placeDimensions(scale, [dimension(0, 80), dimension(80, 84)]).map(({ outside }) => outside)).toEqual([
      false,
      true,
    ]);
  });
});

import { describe, expect, it } from "vitest";
import { bridgeLayout } from "@/app/(workspace)/products/[productCode]/_pictures/bridge-layout";

describe("the bridge between two issues", () => {
  const bridge = bridgeLayout(
    { label: "issue 3", total: 100 },
    [
      { label: "010", delta: -6 },
      { label: "020", delta: 2.5 },
    ],
    { label: "issue 4", total: 96.5 },
  );

  it("starts each step where the one before ended and arrives at the second total", () => {
    expect(bridge.bars.map(({ kind, from, to }) => [kind, kind === "total" ? null : from, to])).toEqual([
      ["total", null, 100],
      ["fall", 100, 94],
      ["rise", 94, 96.5],
      ["total", null, 96.5],
    ]);
  });

  it("holds every step within its scale", () => {
    for (const { from, to } of bridge.bars) {
      expect(Math.min(from, to)).toBeGreaterThanOrEqual(bridge.scale.min);
      expect(Math.max(from, to)).toBeLessThanOrEqual(bridge.scale.max);
    }
  });
});

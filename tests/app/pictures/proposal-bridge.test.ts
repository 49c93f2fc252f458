import { describe, expect, it } from "vitest";
import { proposalBridge } from "@/app/(workspace)/products/[productCode]/_pictures/proposal-bridge";
import type { TrendIssue } from "@/lib/budget/views";

const basis = {
  ...{ kind: "vehicle_fairing" as const, countSize: 0.001, referenceArea: null, flowArea: null },
  ...{ dynamicPressure: 382.8, speed: 25, hoursPerYear: null },
};

function issue(number: number, predicted: number | null): TrendIssue {
  const point = { operatingPoint: "OP-1", name: "Cruise", basic: 0, growth: 0, limit: 100, reserve: 10, margin: 0 };
  return {
    number,
    at: `2026-03-0${number}T00:00:00.000Z`,
    proposal:
      number === 1
        ? null
        : { number: number - 1, label: `T-CP-0${number - 1}`, title: "Change", proposer: { id: 1, name: "Eva" } },
    points: predicted === null ? [] : [{ ...point, predicted, basis, standing: "inside" }],
  };
}

const hundredths = (newtons: number) => Math.round(newtons * 100);

describe("the bridge from any issue to any other", () => {
  // Each of these prints rounded up or down: rounded steps of unrounded totals would not add up.
  const trend = [10.004, 10.0149, 20.0051, 20.0149, 7.335, 7.3449].map((predicted, at) => issue(at + 1, predicted));

  it("has a step for each proposal between them, and the printed steps sum to the printed difference", () => {
    for (let from = 1; from < 6; from += 1) {
      for (let to = from + 1; to <= 6; to += 1) {
        const bridge = proposalBridge(trend, from, to, "OP-1");
        if (!bridge) throw new Error("no bridge");
        expect(bridge.steps.map(({ issue: number }) => number)).toEqual(
          trend.map(({ number }) => number).filter((number) => number > from && number <= to),
        );
        const sum = bridge.steps.reduce((total, { delta }) => total + hundredths(delta), 0);
        expect(sum).toBe(hundredths(bridge.now) - hundredths(bridge.was));
      }
    }
    expect(proposalBridge(trend, 1, 2, "OP-1")).toMatchObject({
      was: 10,
      now: 10.01,
      steps: [{ label: "T-CP-01", proposalNumber: 1, delta: 0.01 }],
    });
  });

  it("goes back from a later issue to an earlier one by the same steps, each taken back", () => {
    for (let from = 2; from <= 6; from += 1) {
      for (let to = 1; to < from; to += 1) {
        const bridge = proposalBridge(trend, from, to, "OP-1");
        const forward = proposalBridge(trend, to, from, "OP-1");
        if (!bridge || !forward) throw new Error("no bridge");
        expect(bridge.steps.map(({ issue: number }) => number)).toEqual(
          forward.steps.map(({ issue: number }) => number).reverse(),
        );
        const sum = bridge.steps.reduce((total, { delta }) => total + hundredths(delta), 0);
        expect(sum).toBe(hundredths(bridge.now) - hundredths(bridge.was));
        expect([bridge.was, bridge.now]).toEqual([forward.now, forward.was]);
      }
    }
  });

  it("lets an issue without the operating point move nothing, and is none where an end has it not", () => {
    const gone = [issue(1, 10), issue(2, null), issue(3, 12)];
    expect(proposalBridge(gone, 1, 3, "OP-1")?.steps.map(({ delta }) => delta)).toEqual([0, 2]);
    expect(proposalBridge(gone, 1, 2, "OP-1")).toBeNull();
    expect(proposalBridge(gone, 1, 3, "OP-9")).toBeNull();
  });
});

import { type Scale, rulerTicks } from "./scale";

export interface BridgeStep {
  label: string;
  /** N; what this line adds to the total between the two issues. */
  delta: number;
}

export interface BridgeBar {
  label: string;
  from: number;
  to: number;
  kind: "total" | "rise" | "fall";
}

export interface BridgeLayout {
  scale: Scale;
  bars: BridgeBar[];
  ticks: number[];
}

/** From one total to another, step by step: each bar starts where the one above it ended. */
export function bridgeLayout(
  before: { label: string; total: number },
  steps: readonly BridgeStep[],
  after: { label: string; total: number },
): BridgeLayout {
  let reached = before.total;
  const moving = steps.map(({ label, delta }): BridgeBar => {
    const from = reached;
    reached += delta;
    return { label, from, to: reached, kind: delta < 0 ? "fall" : "rise" };
  });
  const scale = scaleAround([before.total, after.total, ...moving.map(({ to }) => to)]);

  return {
    scale,
    bars: [
      { label: before.label, from: scale.min, to: before.total, kind: "total" },
      ...moving,
      { label: after.label, from: scale.min, to: after.total, kind: "total" },
    ],
    ticks: rulerTicks(scale, 6),
  };
}

/** Near the totals, not from zero: the steps are small beside them, and the ruler says where it begins. */
function scaleAround(values: readonly number[]): Scale {
  const low = Math.min(...values);
  const high = Math.max(...values);
  const room = Math.max((high - low) * 0.5, Math.abs(high) * 0.005, 0.5);
  return { min: low - room, max: high + room * 0.3 };
}

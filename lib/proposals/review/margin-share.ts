import type { RoundReview } from "./round-review";
import type { MarginEffect } from "../workspace-views";

export function marginEffectOf({ onToday: { change } }: RoundReview): MarginEffect | null {
  const { effects, after } = change;
  const worst = effects.points.find(({ operatingPoint }) => operatingPoint === after.results.worstPoint);
  if (!worst?.was) return null;
  const { operatingPoint, predictedDelta, was } = worst;
  return { operatingPoint, predictedDelta, marginWas: was.margin };
}

/** The share of the margin that a change takes: 0 where it takes nothing, infinite where none is left to be taken. */
export function marginShare(effect: MarginEffect | null): number {
  if (effect === null || effect.predictedDelta <= 0) return 0;
  return effect.marginWas <= 0 ? Infinity : effect.predictedDelta / effect.marginWas;
}

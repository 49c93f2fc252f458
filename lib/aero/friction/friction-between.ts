import type { FrictionLayer } from "./friction-layer";

/** Below this span over start, the difference of two F loses digits and F is integrated instead. */
const SHORT = 1e-3;
/** Below this one, a stretch with a change of formula inside counts with the coefficient at its end. */
const SHORTEST = 1e-9;
const GAUSS = [
  [0.5 - Math.sqrt(0.15), 5 / 18],
  [0.5, 8 / 18],
  [0.5 + Math.sqrt(0.15), 5 / 18],
] as const;

/**
 * Friction of a stretch of a layer: U/ν·[F(x₀ + L) − F(x₀)].
 *
 * @param start U x₀/ν [-], 0 or greater
 * @param span U L/ν [-], greater than 0
 * @returns greater than 0; stretches of one layer add up
 */
export function frictionBetween(layer: FrictionLayer, start: number, span: number): number {
  const end = start + span;
  if (span > SHORT * start) return layer.frictionIntegral(end) - layer.frictionIntegral(start);
  if (layer.pieceAt(start) === layer.pieceAt(end)) {
    return GAUSS.reduce((sum, [node, weight]) => sum + weight * span * layer.localCoefficient(start + node * span), 0);
  }
  if (span > SHORTEST * start) return layer.frictionIntegral(end) - layer.frictionIntegral(start);
  return span * layer.localCoefficient(end);
}

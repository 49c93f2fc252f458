import type { UncertainNumber } from "../document/number-input";
import type { MethodAnswer, MethodOutcome } from "./method-answer";

const WIDE_STEP = 1e-3;
const NARROW_STEP = 1e-6;

/**
 * ∂drag/∂x at the given value, by differences.
 *
 * Five points where the same formulas hold at all of them (relative error below 1e-10); narrower, then one-sided, where a
 * change of line or regime or a refusal is near. A value of 0 has no scale of its own and is stepped by its uncertainty.
 */
export function sensitivity(
  { value, standardUncertainty }: UncertainNumber,
  at: (value: number) => MethodOutcome,
): number {
  const centre = answerAt(at, value);
  if (!centre) return 0;
  if (value === 0) return oneSided(centre, at, value, standardUncertainty);

  const alike = (x: number): MethodAnswer | null => {
    const answer = answerAt(at, x);
    return answer && regimeOf(answer) === regimeOf(centre) ? answer : null;
  };
  const h = WIDE_STEP * Math.abs(value);
  const [low2, low1, high1, high2] = [alike(value - 2 * h), alike(value - h), alike(value + h), alike(value + 2 * h)];
  if (low2 && low1 && high1 && high2) {
    return (low2.drag - high2.drag + 8 * (high1.drag - low1.drag)) / (12 * h);
  }
  const narrow = NARROW_STEP * Math.abs(value);
  const below = alike(value - narrow);
  const above = alike(value + narrow);
  if (below && above) return (above.drag - below.drag) / (2 * narrow);
  if (above) return (above.drag - centre.drag) / narrow;
  return below ? (centre.drag - below.drag) / narrow : 0;
}

function oneSided(centre: MethodAnswer, at: (value: number) => MethodOutcome, value: number, step: number): number {
  const above = answerAt(at, value + step);
  if (above) return (above.drag - centre.drag) / step;
  const below = answerAt(at, value - step);
  return below ? (centre.drag - below.drag) / step : 0;
}

function answerAt(at: (value: number) => MethodOutcome, value: number): MethodAnswer | null {
  const outcome = at(value);
  return outcome.outcome === "answer" ? outcome.answer : null;
}

/** Within one regime drag is a smooth function of every input. */
function regimeOf({ frictionLineUsed, roughnessVerdict, transitionAt }: MethodAnswer): string {
  const start = transitionAt === undefined ? "unreached" : transitionAt === 0 ? "from start" : "reached";
  return [frictionLineUsed, roughnessVerdict, start].join("|");
}

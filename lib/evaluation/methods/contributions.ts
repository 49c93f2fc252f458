import type { FluidInput, MethodInput } from "../document/schema";
import type { MethodAnswer, MethodOutcome } from "./method-answer";
import { evaluateMethod } from "./method-registry";
import { OWN_UNCERTAINTIES } from "./own-uncertainties";
import { sensitivity } from "./sensitivity";
import { streamStateOf } from "./stream-state";
import { uncertainNumbers } from "./uncertain-numbers";

/**
 * What each source of uncertainty does to a drag: sensitivity times standard uncertainty, signed, in newtons. Sources with
 * one key are one quantity (an operating point's speed, a line's bias), so that they add linearly over items.
 */
export type Contributions = ReadonlyMap<string, number>;

/** Square root of the sum of squares: JCGM 100:2008, eq. (10), sources being independent of each other. */
export function standardUncertaintyOf(contributions: Contributions): number {
  return Math.sqrt([...contributions.values()].reduce((sum, newtons) => sum + newtons ** 2, 0));
}

/**
 * Contributions to one item's drag at one operating point, first order.
 *
 * @param itemKey tells this item's own inputs from those of others
 */
export function contributionsOf(
  itemKey: string,
  version: number,
  input: MethodInput,
  point: FluidInput,
  answer: MethodAnswer,
): Contributions {
  return new Map([...givenContributions(itemKey, version, input, point), ...ownContributions(input, answer)]);
}

/** What the line and the method bring by themselves. */
function ownContributions(input: MethodInput, answer: MethodAnswer): [string, number][] {
  const names = answer.frictionLineUsed ? [answer.frictionLineUsed, input.method] : [input.method];
  return names.flatMap((name) => {
    const { relative } = OWN_UNCERTAINTIES[name];
    return relative > 0 ? [[`own:${name}`, relative * answer.drag] satisfies [string, number]] : [];
  });
}

function givenContributions(
  itemKey: string,
  version: number,
  input: MethodInput,
  point: FluidInput,
): [string, number][] {
  const given = { item: input, point };
  return uncertainNumbers(given).flatMap(({ path, number }, index) => {
    if (number.standardUncertainty === 0) return [];
    const outcomeAt = (value: number): MethodOutcome => {
      const probe = structuredClone(given);
      const target = uncertainNumbers(probe)[index];
      if (target) target.number.value = value;
      return evaluateMethod(probe.item.method, version, probe.item, streamStateOf(probe.point));
    };
    const key = path.startsWith("item.") ? `item:${itemKey}:${path.slice("item.".length)}` : path.replace(".", ":");
    return [[key, sensitivity(number, outcomeAt) * number.standardUncertainty] satisfies [string, number]];
  });
}

import { figure } from "./figure";
import type { NoteCode } from "./note-code";
import { refusal, type NoteMeaning } from "./note-meaning";

export const REFUSALS = {
  "reynolds-outside-every-line": refusal(
    ({ reynolds, min, max }) =>
      `Re ${figure(reynolds)} at the end of the layer is outside every friction line (${figure(min)} to ${figure(max)}). ` +
      `Check length, speed and viscosity, or take another method.`,
  ),
  "transition-below-limit": refusal(
    ({ transitionReynolds, limit }) =>
      `Transition at Re ${figure(transitionReynolds)} is below Re ${figure(limit)}, where no layer stays turbulent. Put the ` +
      `trip at the start of the layer (0) or further downstream.`,
  ),
  "duct-blocked": refusal(
    ({ displacementThickness, shorterSide }) =>
      `The layers block the duct: 2δ* is ${figure(twice(displacementThickness))} m on a side of ${figure(shorterSide)} m. ` +
      `The duct is too long or too narrow for plates from the entry; use a developed-flow loss.`,
  ),
  "share-circle": refusal(
    ({ circle }) =>
      `The share takes part in a circle (${figure(circle)}): its drag would depend on itself. Name other items, or move it out ` +
      `of the group that it names.`,
  ),
  "share-of-refused": refusal(
    ({ item }) =>
      `The share takes from item ${figure(item)}, which is refused at this operating point. Settle that item first.`,
  ),
} satisfies Partial<Record<NoteCode, NoteMeaning>>;

function twice(value: number | string | undefined): number {
  return typeof value === "number" ? 2 * value : NaN;
}

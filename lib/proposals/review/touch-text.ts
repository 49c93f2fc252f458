import type { ItemEffect } from "@/lib/evaluation/budget/effects";
import type { Touch } from "@/lib/evaluation/budget/touches";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { toHundredths } from "@/lib/units/rounding";

/** "Finish F30 Smooth paint", "Flat-plate friction, version 2". */
export function touchTitle(touch: Touch): string {
  return touch.by === "finish"
    ? `Finish ${touch.number} ${touch.name}`
    : `${ITEM_METHODS[touch.method].label}, version ${touch.version}`;
}

/** Whom it reaches, and who of them moves by 0.01 N or more: "is on 5 items: 010, 020 … 2 of them move: 010, 020." */
export function touchSentence(touch: Touch, effects: readonly ItemEffect[]): string {
  const { by, items } = touch;
  if (items.length === 0) return "is on no item: nothing moves by it.";
  const count = items.length === 1 ? "1 item" : `${items.length} items`;
  const moved = items.filter((item) =>
    effects.some((effect) => effect.item === item && toHundredths(effect.predictedDelta) !== 0),
  );
  const reach = `${by === "finish" ? "is on" : "is adopted by"} ${count}: ${items.join(", ")}.`;
  if (moved.length === 0) return `${reach} None of them moves by 0.01 N or more.`;
  if (moved.length === items.length) return `${reach} ${items.length === 1 ? "It moves" : "All of them move"}.`;
  return `${reach} ${moved.length === 1 ? "One of them moves" : `${moved.length} of them move`}: ${moved.join(", ")}.`;
}

import type { ItemBody } from "../lines/item-body";

type Items = ReadonlyMap<string, ItemBody>;
type Plate = Extract<ItemBody, { method: "flat-plate-friction" }>;

/**
 * Wetted length ahead of a plate, m: as typed, or that of the plate it lies behind with that plate's own length.
 *
 * @throws RangeError if a plate lies behind what is no plate, or behind itself: no change may bring that about
 */
export function runUpOf(plate: Plate, items: Items): number {
  let length = 0;
  let current = plate;
  const passed = new Set<string>();
  while (current.runUpFollows && current.liesBehind !== null) {
    const ahead = items.get(current.liesBehind);
    if (ahead?.method !== "flat-plate-friction" || passed.has(current.liesBehind)) {
      throw new RangeError(`nothing to lie behind at item ${current.liesBehind}`);
    }
    passed.add(current.liesBehind);
    length += ahead.length.value;
    current = ahead;
  }
  return length + current.runUp.value;
}

/** Wetted length ahead of whatever lay behind that item, m; null where it is no plate. */
export function runUpBehind(ahead: string, items: Items): number | null {
  const plate = items.get(ahead);
  return plate?.method === "flat-plate-friction" ? runUpOf(plate, items) + plate.length.value : null;
}

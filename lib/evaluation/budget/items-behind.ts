import type { ItemBody } from "../lines/item-body";

interface ItemBehind {
  item: string;
  /** The changed item that lies ahead of it, over however many plates. */
  ahead: string;
}

/** Items in force that lie behind one of those, in the order of the sheet's map; one that is itself among them not. */
export function itemsBehind(changed: readonly string[], items: ReadonlyMap<string, ItemBody>): ItemBehind[] {
  return [...items.keys()].flatMap((item) => {
    const ahead = changed.includes(item) ? null : changedAhead(item, changed, items);
    return ahead === null ? [] : [{ item, ahead }];
  });
}

function changedAhead(item: string, changed: readonly string[], items: ReadonlyMap<string, ItemBody>): string | null {
  const passed = new Set<string>();
  for (let current: string | null = item; current !== null && !passed.has(current);) {
    passed.add(current);
    const body = items.get(current);
    current = body?.method === "flat-plate-friction" ? body.liesBehind : null;
    if (current !== null && changed.includes(current)) return current;
  }
  return null;
}

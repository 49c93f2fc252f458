import type { ItemInput } from "./schema";

/** Items in an order in which each comes after those it takes a share of, and the ones for which there is none. */
export interface ShareOrder {
  ordered: ItemInput[];
  /** Shares that would depend on themselves: id → the circle, written out. */
  circles: ReadonlyMap<string, string>;
  /** Shares outside any circle that depend on one. */
  stuck: ItemInput[];
}

/** Ids of the items that a share takes its fraction of, in the order of the document. */
export function membersOf(item: ItemInput, items: readonly ItemInput[]): string[] {
  if (item.method !== "share") return [];
  if (item.of) return item.of;
  return items.filter(({ group }) => group !== undefined && group === item.ofGroup).map(({ id }) => id);
}

export function shareOrder(items: readonly ItemInput[]): ShareOrder {
  const members = new Map(items.map((item) => [item.id, membersOf(item, items)]));
  const ordered: ItemInput[] = [];
  const done = new Set<string>();
  let waiting = [...items];
  for (let before = -1; before !== waiting.length;) {
    before = waiting.length;
    waiting = waiting.filter((item) => {
      if (!members.get(item.id)?.every((id) => done.has(id))) return true;
      done.add(item.id);
      ordered.push(item);
      return false;
    });
  }
  const circles = new Map<string, string>();
  for (const { id } of waiting) {
    const circle = circleThrough(id, members);
    if (circle) circles.set(id, circle.join(" → "));
  }
  return { ordered, circles, stuck: waiting.filter(({ id }) => !circles.has(id)) };
}

/** The shortest way from an id back to itself, both ends included. */
function circleThrough(start: string, members: ReadonlyMap<string, string[]>): string[] | null {
  const cameFrom = new Map<string, string>();
  const queue = [start];
  for (const id of queue) {
    for (const next of members.get(id) ?? []) {
      if (next === start) return wayBack(start, id, cameFrom);
      if (cameFrom.has(next)) continue;
      cameFrom.set(next, id);
      queue.push(next);
    }
  }
  return null;
}

function wayBack(start: string, last: string, cameFrom: ReadonlyMap<string, string>): string[] {
  const way = [start];
  for (let id: string | undefined = last; id !== undefined && id !== start; id = cameFrom.get(id)) way.unshift(id);
  return [start, ...way];
}

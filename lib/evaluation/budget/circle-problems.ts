import type { ItemBody } from "../lines/item-body";
import { groupsAboveItem } from "./group-tree";
import type { IndexedState } from "./indexed-state";
import { shareMembers } from "./share-members";
import type { Cause, Problem } from "./problem";

/** Circles of groups, of plates that lie behind one another, and of shares: the first of each kind. */
export function circleProblems(state: IndexedState): Problem[] {
  return [...groupCircle(state), ...runUpCircle(state), ...shareCircle(state)];
}

function groupCircle({ groups }: IndexedState): Problem[] {
  const circle = findCircle([...groups.keys()], (group) => {
    const parent = groups.get(group)?.parent ?? null;
    return parent === null ? [] : [parent];
  });
  if (!circle) return [];
  const sentence = `Groups would hold one another in a circle: ${circle.join(" → ")}.`;
  return [{ causes: circle.map((number) => ({ kind: "group", number, path: "body.parent", sentence })) }];
}

function runUpCircle({ items }: IndexedState): Problem[] {
  const circle = findCircle(numbersOf(items, "flat-plate-friction"), (item) => {
    const body = items.get(item);
    return body?.method === "flat-plate-friction" && body.liesBehind !== null ? [body.liesBehind] : [];
  });
  if (!circle) return [];
  const sentence = `Plates would lie behind one another in a circle: ${circle.join(" → ")}.`;
  return [{ causes: circle.map((number) => ({ kind: "item", number, path: "body.liesBehind", sentence })) }];
}

function shareCircle(state: IndexedState): Problem[] {
  const circle = findCircle(numbersOf(state.items, "share"), (item) => {
    const body = state.items.get(item);
    return body?.method === "share" ? shareMembers(body, state) : [];
  });
  if (!circle) return [];

  const sentence = `A share would depend on itself: ${circle.join(" → ")}.`;
  const shares = circle.map((number): Cause => ({ kind: "item", number, path: shareField(number, state), sentence }));
  // Moving a group closes a circle as well as what the shares themselves name.
  const groups = circle.flatMap((number) => groupsAboveItem(state, number));
  return [
    {
      causes: [...shares, ...groups.map((number): Cause => ({ kind: "group", number, path: "body.parent", sentence }))],
    },
  ];
}

function shareField(number: string, { items }: IndexedState): string {
  const body = items.get(number);
  return body?.method === "share" && body.ofGroup !== null ? "body.ofGroup" : "body.of";
}

/** Only such items lead on to others. */
function numbersOf(items: IndexedState["items"], method: ItemBody["method"]): string[] {
  const numbers: string[] = [];
  for (const [number, body] of items) if (body.method === method) numbers.push(number);
  return numbers;
}

/** A way that comes back to its start, as "a, b, a"; null where there is none. */
function findCircle(nodes: readonly string[], next: (node: string) => readonly string[]): string[] | null {
  const done = new Set<string>();
  for (const start of nodes) {
    if (done.has(start)) continue;
    const circle = walk(start, [], done, next);
    if (circle) return circle;
  }
  return null;
}

function walk(
  node: string,
  way: readonly string[],
  done: Set<string>,
  next: (node: string) => readonly string[],
): string[] | null {
  if (way.includes(node)) return [...way.slice(way.indexOf(node)), node];
  if (done.has(node)) return null;

  for (const following of next(node)) {
    const circle = walk(following, [...way, node], done, next);
    if (circle) return circle;
  }
  done.add(node);
  return null;
}

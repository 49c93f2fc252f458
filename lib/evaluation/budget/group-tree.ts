import type { IndexedState } from "./indexed-state";
import { oncePer } from "./once-per";

type Tree = Pick<IndexedState, "items" | "groups">;

/** The groups above a group, nearest first, the group itself left out. Ends where a circle would begin. */
export function groupsAboveGroup(tree: Tree, group: string): string[] {
  const above: string[] = [];
  let parent = tree.groups.get(group)?.parent ?? null;
  while (parent !== null && parent !== group && !above.includes(parent)) {
    above.push(parent);
    parent = tree.groups.get(parent)?.parent ?? null;
  }
  return above;
}

/** The groups that hold an item, nearest first. */
export function groupsAboveItem(tree: Tree, item: string): string[] {
  const group = tree.items.get(item)?.group ?? null;
  return group === null ? [] : [group, ...groupsAboveGroup(tree, group)];
}

/** Every item of a group and of its subgroups. */
export function itemsOfGroup(tree: Tree, group: string): readonly string[] {
  const within = groupWithSubgroups(tree, group);
  if (within.size === 1) return itemsByGroup(tree.items).get(group) ?? [];
  return [...tree.items].flatMap(([item, body]) => (body.group !== null && within.has(body.group) ? [item] : []));
}

function groupWithSubgroups({ groups }: Tree, group: string): ReadonlySet<string> {
  const within = new Set([group]);
  for (let before = 0; before < within.size;) {
    before = within.size;
    for (const [number, { parent }] of groups) if (parent !== null && within.has(parent)) within.add(number);
  }
  return within;
}

const itemsByGroup = oncePer((items: Tree["items"]): ReadonlyMap<string, readonly string[]> => {
  const byGroup = new Map<string, string[]>();
  for (const [item, { group }] of items) {
    if (group === null) continue;
    const others = byGroup.get(group);
    if (others) others.push(item);
    else byGroup.set(group, [item]);
  }
  return byGroup;
});

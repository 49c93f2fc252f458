import type { IndexedState } from "./indexed-state";

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
export function itemsOfGroup(tree: Tree, group: string): string[] {
  return [...tree.items.keys()].filter((item) => groupsAboveItem(tree, item).includes(group));
}

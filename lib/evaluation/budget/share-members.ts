import type { ItemBody } from "../lines/item-body";
import { itemsOfGroup } from "./group-tree";
import type { IndexedState } from "./indexed-state";

type Share = Extract<ItemBody, { method: "share" }>;

/** The items whose basic estimates a share adds up: savings of a group only where it asks for them. */
export function shareMembers(share: Share, state: Pick<IndexedState, "items" | "groups">): readonly string[] {
  if (share.ofGroup === null) return share.of;
  const members = itemsOfGroup(state, share.ofGroup);
  return members.filter((item) => share.includeSavings || state.items.get(item)?.saving !== true);
}

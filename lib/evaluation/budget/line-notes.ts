import type { ItemBody } from "../lines/item-body";
import { makeNote } from "../notes/note-catalogue";
import type { Note } from "../notes/note";
import type { IndexedState } from "./indexed-state";
import { compareNumbers } from "./sheet-order";

type Plate = Extract<ItemBody, { method: "flat-plate-friction" }>;

/** Notes that come from how items stand to one another; the method of one item alone cannot know them. */
export function lineNotes(item: string, { items }: Pick<IndexedState, "items">): Note[] {
  const body = items.get(item);
  if (body?.method !== "flat-plate-friction") return [];

  const startsAnew = body.liesBehind !== null && !body.runUpFollows && body.runUp.value === 0;
  return [
    ...(startsAnew && body.liesBehind !== null
      ? [makeNote("fresh-leading-edge-behind", { behind: body.liesBehind })]
      : []),
    ...twinsOf(item, body, items).map((other) => makeNote("same-surface-twice", { other })),
  ];
}

/** Plates that agree in everything that places them: most likely the same surface, entered twice. */
function twinsOf(item: string, plate: Plate, items: IndexedState["items"]): string[] {
  return [...items]
    .filter(([number, other]) => number !== item && other.method === "flat-plate-friction" && samePlace(plate, other))
    .map(([number]) => number)
    .sort(compareNumbers);
}

function samePlace(one: Plate, other: Plate): boolean {
  return (
    one.group === other.group &&
    one.length.value === other.length.value &&
    one.breadth.value === other.breadth.value &&
    one.faces === other.faces &&
    one.liesBehind === other.liesBehind &&
    one.runUp.value === other.runUp.value &&
    one.localSpeedRatio === other.localSpeedRatio &&
    one.finish === other.finish &&
    one.roughness?.value === other.roughness?.value
  );
}

import type { ItemBody } from "../lines/item-body";
import { makeNote } from "../notes/note-catalogue";
import type { Note } from "../notes/note";
import { compareNumbers } from "./sheet-order";

type Items = ReadonlyMap<string, ItemBody>;

/** Items by the place that they say they are in. */
export type Places = ReadonlyMap<string, readonly string[]>;

export function placesOf(items: Items): Places {
  const places = new Map<string, string[]>();
  for (const [item, body] of items) {
    const place = placeOf(body);
    if (place === null) continue;
    const others = places.get(place);
    if (others) others.push(item);
    else places.set(place, [item]);
  }
  return places;
}

/** Notes that come from how items stand to one another; the method of one item alone cannot know them. */
export function lineNotes(item: string, body: ItemBody, places: Places): Note[] {
  if (body.method !== "flat-plate-friction") return [];

  const { liesBehind, runUpFollows, runUp } = body;
  const startsAnew = liesBehind !== null && !runUpFollows && runUp.value === 0;
  return [
    ...(startsAnew ? [makeNote("fresh-leading-edge-behind", { behind: liesBehind })] : []),
    ...twinsOf(item, body, places).map((other) => makeNote("same-surface-twice", { other })),
  ];
}

function twinsOf(item: string, body: ItemBody, places: Places): string[] {
  const inPlace = places.get(placeOf(body) ?? "") ?? [];
  return inPlace.filter((other) => other !== item).sort(compareNumbers);
}

/** Plates that agree in everything that places them are most likely the same surface, entered twice. */
function placeOf(body: ItemBody): string | null {
  if (body.method !== "flat-plate-friction") return null;
  const { group, length, breadth, faces, liesBehind, runUp, localSpeedRatio, finish, roughness } = body;
  const sizes = [length.value, breadth.value, faces, runUp.value, localSpeedRatio, roughness?.value];
  return JSON.stringify([group, liesBehind, finish, ...sizes]);
}

import type { ItemBody } from "../lines/item-body";
import { makeNote } from "../notes/note-catalogue";
import type { Note, NoteValues } from "../notes/note";
import { runUpBehind } from "./run-up";
import { compareNumbers } from "./sheet-order";

type Items = ReadonlyMap<string, ItemBody>;

/** The places that items say they are in, and who else says so. */
export interface Places {
  items: Items;
  placesOf: ReadonlyMap<string, readonly string[]>;
  itemsAt: ReadonlyMap<string, readonly string[]>;
}

export function placesOf(items: Items): Places {
  const placesOf = new Map<string, readonly string[]>();
  const itemsAt = new Map<string, string[]>();
  for (const [item, body] of items) {
    const places = placesOfItem(body);
    placesOf.set(item, places);
    for (const place of places) {
      const others = itemsAt.get(place);
      if (others) others.push(item);
      else itemsAt.set(place, [item]);
    }
  }
  return { items, placesOf, itemsAt };
}

/**
 * Notes that come from how items stand to one another; the method of one item alone cannot know them. Where a plate
 * starts anew though another lies ahead of it, the note carries the run-up that it would have as the rest of one plate.
 */
export function lineNotes(item: string, body: ItemBody, places: Places): Note[] {
  return [
    ...freshEdgeNotes(body, places),
    ...twinsOf(item, body, places).map((other) => twinNote(body, other, places)),
  ];
}

function freshEdgeNotes(body: ItemBody, { items }: Places): Note[] {
  if (body.method !== "flat-plate-friction") return [];
  const { liesBehind, runUpFollows, runUp } = body;
  if (liesBehind === null || runUpFollows || runUp.value !== 0) return [];
  return [makeNote("fresh-leading-edge-behind", { behind: liesBehind, ...runUpValue(liesBehind, items) })];
}

/** Butted plates that each start anew: what the second would have behind the first is told with the note. */
function twinNote(body: ItemBody, other: string, { items }: Places): Note {
  const startsAnew = body.method === "flat-plate-friction" && body.liesBehind === null && body.runUp.value === 0;
  const named: NoteValues = body.surface === "" ? {} : { surface: body.surface };
  return makeNote("same-surface-twice", { other, ...named, ...(startsAnew ? runUpValue(other, items) : {}) });
}

function runUpValue(ahead: string, items: Items): { runUp?: number } {
  const runUp = runUpBehind(ahead, items);
  return runUp === null ? {} : { runUp };
}

function twinsOf(item: string, body: ItemBody, { items, placesOf, itemsAt }: Places): string[] {
  const shared = (placesOf.get(item) ?? []).flatMap((place) => itemsAt.get(place) ?? []);
  const others = shared.filter((other) => other !== item);
  if (others.length === 0) return [];
  return [...new Set(others)]
    .filter((other) => !isNamedApart(body, items.get(other)))
    .filter((other) => !liesInLine(item, other, items) && !liesInLine(other, item, items))
    .sort(compareNumbers);
}

/** Two that name different surfaces or streams are not the same one, however alike they are. */
function isNamedApart({ surface, stream }: ItemBody, other: ItemBody | undefined): boolean {
  if (other === undefined || surface === "" || other.surface === "") return false;
  return alike(surface) !== alike(other.surface) || alike(stream) !== alike(other.stream);
}

/** One of them lies behind the other, over however many plates: they cover stretches of their own. */
function liesInLine(item: string, other: string, items: Items): boolean {
  const passed = new Set<string>();
  for (let current: string | null = item; current !== null && !passed.has(current);) {
    if (current === other) return true;
    passed.add(current);
    const body = items.get(current);
    current = body?.method === "flat-plate-friction" ? body.liesBehind : null;
  }
  return false;
}

/** Items are in one place that name one surface in one stream, and plates that agree in everything that places them. */
function placesOfItem(body: ItemBody): string[] {
  const { surface, stream } = body;
  const named = surface === "" ? [] : [JSON.stringify(["named", alike(surface), alike(stream)])];
  if (body.method !== "flat-plate-friction") return named;

  const { group, length, breadth, faces, liesBehind, runUp, localSpeedRatio, finish, roughness } = body;
  const sizes = [length.value, breadth.value, faces, runUp.value, localSpeedRatio, roughness?.value];
  return [...named, JSON.stringify(["sized", group, liesBehind, finish, ...sizes])];
}

function alike(name: string): string {
  return name.toLocaleLowerCase("en").replaceAll(/\s+/g, " ");
}

import type { ItemBody } from "../lines/item-body";
import { makeNote } from "../notes/note-catalogue";
import type { Note, NoteValues } from "../notes/note";
import { oncePer } from "./once-per";
import { runUpBehind } from "./run-up";
import { compareNumbers } from "./sheet-order";

type Items = ReadonlyMap<string, ItemBody>;

/** Who says to be in a place. */
const itemsByPlace = oncePer((items: Items): ReadonlyMap<string, readonly string[]> => {
  const itemsAt = new Map<string, string[]>();
  for (const [item, body] of items) {
    for (const place of placesOf(body)) {
      const others = itemsAt.get(place);
      if (others) others.push(item);
      else itemsAt.set(place, [item]);
    }
  }
  return itemsAt;
});

/**
 * Notes that come from how items stand to one another; the method of one item alone cannot know them. Where a plate
 * starts anew though another lies ahead of it, the note carries the run-up that it would have as the rest of one plate.
 */
export function lineNotes(item: string, body: ItemBody, items: Items): Note[] {
  return [...freshEdgeNotes(body, items), ...twinsOf(item, body, items).map((other) => twinNote(body, other, items))];
}

/** The items that share a place or start anew behind a plate: nobody else has a note of this kind. */
export const itemsWithNeighbours = oncePer((items: Items): readonly string[] => {
  const shared = [...itemsByPlace(items).values()].filter(({ length }) => length > 1).flat();
  const behind = [...items].flatMap(([item, body]) => (plateAheadOf(body) === null ? [] : [item]));
  return [...new Set([...shared, ...behind])];
});

function freshEdgeNotes(body: ItemBody, items: Items): Note[] {
  const ahead = plateAheadOf(body);
  return ahead === null ? [] : [makeNote("fresh-leading-edge-behind", { behind: ahead, ...runUpValue(ahead, items) })];
}

/** The plate ahead of one that nevertheless starts anew. */
function plateAheadOf(body: ItemBody): string | null {
  if (body.method !== "flat-plate-friction" || body.runUpFollows || body.runUp.value !== 0) return null;
  return body.liesBehind;
}

/** Butted plates that each start anew: what the second would have behind the first is told with the note. */
function twinNote(body: ItemBody, other: string, items: Items): Note {
  const startsAnew = body.method === "flat-plate-friction" && body.liesBehind === null && body.runUp.value === 0;
  const named: NoteValues = body.surface === "" ? {} : { surface: body.surface };
  return makeNote("same-surface-twice", { other, ...named, ...(startsAnew ? runUpValue(other, items) : {}) });
}

function runUpValue(ahead: string, items: Items): { runUp?: number } {
  const runUp = runUpBehind(ahead, items);
  return runUp === null ? {} : { runUp };
}

function twinsOf(item: string, body: ItemBody, items: Items): string[] {
  return [...new Set(othersInItsPlaces(item, body, items))]
    .filter((other) => !isNamedApart(body, items.get(other)))
    .filter((other) => !liesInLine(item, other, items) && !liesInLine(other, item, items))
    .sort(compareNumbers);
}

function othersInItsPlaces(item: string, body: ItemBody, items: Items): string[] {
  const itemsAt = itemsByPlace(items);
  const shared = placesOf(body).flatMap((place) => itemsAt.get(place) ?? []);
  return shared.filter((other) => other !== item);
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
const placesOf = oncePer((body: ItemBody): readonly string[] => {
  const { surface, stream } = body;
  const named = surface === "" ? [] : [JSON.stringify(["named", alike(surface), alike(stream)])];
  if (body.method !== "flat-plate-friction") return named;

  const { group, length, breadth, faces, liesBehind, runUp, localSpeedRatio, finish, roughness } = body;
  const sizes = [length.value, breadth.value, faces, runUp.value, localSpeedRatio, roughness?.value];
  return [...named, JSON.stringify(["sized", group, liesBehind, finish, ...sizes])];
});

function alike(name: string): string {
  return name.toLocaleLowerCase("en").replaceAll(/\s+/g, " ");
}

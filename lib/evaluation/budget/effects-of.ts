import { roundStored } from "@/lib/units/rounding";
import type { Note } from "../notes/note";
import type { Effects, ItemEffect, PointEffect, PointFigures } from "./effects";
import type { BudgetResults, ItemResult, PointResult } from "./results";
import { resultsByItem } from "./results-by-item";

/** What lies between two evaluations: totals and standings, items that moved, notes that came and went. */
export function effectsOf(before: BudgetResults, after: BudgetResults, edited: readonly string[] = []): Effects {
  const numbers = [...new Set([...after.points, ...before.points].map((point) => point.operatingPoint))];
  const pairs = numbers.map((number) => ({ was: pointOf(before, number), now: pointOf(after, number) }));
  const items = pairs.flatMap(({ was, now }) => itemEffects(was, now, edited));
  return {
    points: pairs.flatMap(({ was, now }) => pointEffect(was, now)),
    items,
    followers: items.filter((effect) => !effect.edited),
  };
}

function pointEffect(was: PointResult | undefined, now: PointResult | undefined): PointEffect[] {
  const named = now ?? was;
  if (!named) return [];
  const delta = (pick: (point: PointResult) => number) => (was && now ? roundStored(pick(now) - pick(was)) : 0);
  return [
    {
      operatingPoint: named.operatingPoint,
      name: named.name,
      was: was ? figuresOf(was) : null,
      now: now ? figuresOf(now) : null,
      predictedDelta: delta(({ totals }) => totals.predicted),
      marginDelta: delta(({ totals }) => totals.margin),
    },
  ];
}

function figuresOf({ limitHundredths, reserveHundredths, totals, standing }: PointResult): PointFigures {
  const { basic, growth, predicted, margin, clearOfReserve } = totals;
  return { limitHundredths, reserveHundredths, basic, growth, predicted, margin, clearOfReserve, standing };
}

function itemEffects(
  was: PointResult | undefined,
  now: PointResult | undefined,
  edited: readonly string[],
): ItemEffect[] {
  const before = was ? resultsByItem(was) : NONE;
  const isSamePoint = was !== undefined && now !== undefined;
  // Most results are the very ones of before, and stand at the same place of the sheet.
  const isTouched = (result: ItemResult, place: number) =>
    !isSamePoint || (was.items[place] !== result && before.get(result.item) !== result) || edited.includes(result.item);
  return [
    ...(now?.items.filter(isTouched) ?? []).map((result) => [before.get(result.item), result] as const),
    ...goneItems(was, now, before).map((result) => [result, undefined] as const),
  ]
    .map(([earlier, later]) => itemEffect(earlier, later, isSamePoint, edited.includes((later ?? earlier)?.item ?? "")))
    .filter((effect) => effect !== null)
    .filter((effect) => effect.edited || !isSamePoint || isMoved(effect));
}

/** Results that have none after them. Where as many come as were, none can have gone. */
function goneItems(
  was: PointResult | undefined,
  now: PointResult | undefined,
  before: ReadonlyMap<string, ItemResult>,
): ItemResult[] {
  const items = now?.items ?? [];
  const isKept = ({ item }: ItemResult, place: number) => was?.items[place]?.item === item || before.has(item);
  if (items.filter(isKept).length === before.size) return [];
  const after = new Set(items.map(({ item }) => item));
  return was?.items.filter(({ item }) => !after.has(item)) ?? [];
}

function itemEffect(
  was: ItemResult | undefined,
  now: ItemResult | undefined,
  isSamePoint: boolean,
  edited: boolean,
): ItemEffect | null {
  const named = now ?? was;
  if (!named) return null;
  const figure = (result: ItemResult | undefined, name: "basic" | "predicted") =>
    result && result.refused === null ? result[name] : null;
  // At an operating point that comes or goes nothing moves: there is no total to compare.
  const delta = (name: "basic" | "predicted") =>
    isSamePoint ? roundStored((figure(now, name) ?? 0) - (figure(was, name) ?? 0)) : 0;
  return {
    item: named.item,
    operatingPoint: named.operatingPoint,
    edited,
    basicWas: figure(was, "basic"),
    basicNow: figure(now, "basic"),
    predictedWas: figure(was, "predicted"),
    predictedNow: figure(now, "predicted"),
    basicDelta: delta("basic"),
    predictedDelta: delta("predicted"),
    newNotes: notesMissing(now, was),
    vanishedNotes: notesMissing(was, now),
    refusedNow: was?.refused ? null : (now?.refused ?? null),
  };
}

function isMoved({ basicDelta, predictedDelta, basicWas, basicNow, newNotes, vanishedNotes }: ItemEffect): boolean {
  const cameOrWent = (basicWas === null) !== (basicNow === null);
  return cameOrWent || basicDelta !== 0 || predictedDelta !== 0 || newNotes.length > 0 || vanishedNotes.length > 0;
}

const NONE: ReadonlyMap<string, ItemResult> = new Map();

/** Notes of one side that the other doesn't carry. */
function notesMissing(side: ItemResult | undefined, other: ItemResult | undefined): Note[] {
  const known = (other?.notes ?? []).map(noteKey);
  return (side?.notes ?? []).filter((note) => !known.includes(noteKey(note)));
}

/** The same matter with other figures is the same note; about another line or item it is a new one. */
function noteKey({ code, values }: Note): string {
  const words = Object.entries(values).filter(([, value]) => typeof value === "string");
  return [code, ...words.map(([name, value]) => `${name}=${value}`).sort()].join(" ");
}

function pointOf(results: BudgetResults, number: string): PointResult | undefined {
  return results.points.find((point) => point.operatingPoint === number);
}

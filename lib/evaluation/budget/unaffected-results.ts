import type { ItemBody } from "../lines/item-body";
import { OPERATING_POINT_STATE_FIELDS } from "../lines/operating-point-body";
import { sameBody } from "../lines/same-body";
import type { BudgetState } from "../lines/line-state";
import type { EvaluationOptions } from "./evaluate-budget";
import { indexState, type IndexedState } from "./indexed-state";
import { lineNotes, placesOf, type Places } from "./line-notes";
import type { BudgetResults, ItemResult } from "./results";
import { runUpOf } from "./run-up";
import { shareMembers } from "./share-members";

/**
 * The frozen results that a change leaves as they are. What depends on nothing that moved is never computed anew: an
 * approved number doesn't change because a formula did.
 */
export function unaffectedResults(
  before: BudgetState,
  after: BudgetState,
  frozen: BudgetResults,
): NonNullable<EvaluationOptions["frozen"]> {
  const [was, now] = [indexState(before), indexState(after)];
  const movedItems = itemsMoved(was, now);
  const movedPoints = pointsMoved(was, now);
  const results = new Map<string, ItemResult>();
  for (const point of frozen.points) {
    if (movedPoints.has(point.operatingPoint)) continue;
    for (const result of point.items) {
      if (!movedItems.has(result.item)) results.set(`${point.operatingPoint} ${result.item}`, result);
    }
  }
  return (operatingPoint, item) => results.get(`${operatingPoint} ${item}`);
}

function pointsMoved(was: IndexedState, now: IndexedState): ReadonlySet<string> {
  const moved = new Set<string>();
  for (const [number, point] of now.operatingPoints) {
    const earlier = was.operatingPoints.get(number);
    const isSame = earlier && OPERATING_POINT_STATE_FIELDS.every((field) => sameBody(earlier[field], point[field]));
    if (!isSame) moved.add(number);
  }
  return moved;
}

function itemsMoved(was: IndexedState, now: IndexedState): ReadonlySet<string> {
  const places = [placesOf(was.items), placesOf(now.items)] as const;
  const moved = new Set([...now.items.keys()].filter((item) => isMovedItself(item, was, now, places)));
  // Shares of shares: as long as one more follows, another may follow it.
  for (let grown = true; grown;) {
    const followers = [...now.items].filter(
      ([item, body]) => !moved.has(item) && followsMembers(body, moved, was, now),
    );
    for (const [item] of followers) moved.add(item);
    grown = followers.length > 0;
  }
  return moved;
}

/** What an item reads besides the results of others. */
function isMovedItself(
  item: string,
  was: IndexedState,
  now: IndexedState,
  [placesWas, placesNow]: readonly [Places, Places],
): boolean {
  const [earlier, body] = [was.items.get(item), now.items.get(item)];
  if (!earlier || !body || !sameBody(earlier, body)) return true;
  if (was.terms.growthTable[body.grade] !== now.terms.growthTable[body.grade]) return true;
  if (readsMovedLine(body, was, now)) return true;
  return !sameBody(lineNotes(item, earlier, placesWas), lineNotes(item, body, placesNow));
}

function readsMovedLine(body: ItemBody, was: IndexedState, now: IndexedState): boolean {
  switch (body.method) {
    case "flat-plate-friction":
      return (
        finishMoved(body.finish, was, now) ||
        (body.runUpFollows && runUpOf(body, was.items) !== runUpOf(body, now.items))
      );
    case "duct-entry":
      return finishMoved(body.finish, was, now) || !sameBody(was.terms.flowArea, now.terms.flowArea);
    case "loss-coefficient":
      return !sameBody(was.terms.flowArea, now.terms.flowArea);
    default:
      return false;
  }
}

function finishMoved(finish: string | null, was: IndexedState, now: IndexedState): boolean {
  return finish !== null && !sameBody(was.finishes.get(finish)?.roughness, now.finishes.get(finish)?.roughness);
}

function followsMembers(body: ItemBody, moved: ReadonlySet<string>, was: IndexedState, now: IndexedState): boolean {
  if (body.method !== "share") return false;
  const members = shareMembers(body, now);
  return (
    members.some((member) => moved.has(member)) || !sameBody(shareMembers(body, was).toSorted(), members.toSorted())
  );
}

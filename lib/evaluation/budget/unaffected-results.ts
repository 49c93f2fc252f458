import type { ItemBody } from "../lines/item-body";
import { OPERATING_POINT_STATE_FIELDS } from "../lines/operating-point-body";
import { sameBody } from "../lines/same-body";
import type { BudgetState } from "../lines/line-state";
import type { EvaluationOptions } from "./evaluate-budget";
import { indexState, type IndexedState } from "./indexed-state";
import { itemsWithNeighbours, lineNotes } from "./line-notes";
import type { BudgetResults } from "./results";
import { resultsByItem } from "./results-by-item";
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
  const kept = new Map(
    frozen.points.flatMap((point) =>
      movedPoints.has(point.operatingPoint) ? [] : [[point.operatingPoint, resultsByItem(point)]],
    ),
  );
  return (operatingPoint, item) => (movedItems.has(item) ? undefined : kept.get(operatingPoint)?.get(item));
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
  const moved = new Set(itemsWithOtherNotes(was, now));
  for (const item of now.items.keys()) if (isMovedItself(item, was, now)) moved.add(item);
  const shares = sharesOf(was, now);
  for (const { item, isRegrouped } of shares) if (isRegrouped) moved.add(item);
  // Shares of shares: as long as one more follows, another may follow it.
  for (let grown = true; grown;) {
    const followers = shares.filter(({ item, members }) => !moved.has(item) && members.some((each) => moved.has(each)));
    for (const { item } of followers) moved.add(item);
    grown = followers.length > 0;
  }
  return moved;
}

interface ShareNow {
  item: string;
  members: readonly string[];
  /** Whether others than before are its members. */
  isRegrouped: boolean;
}

function sharesOf(was: IndexedState, now: IndexedState): ShareNow[] {
  const isTreeKept = sameTree(was, now);
  const shares: ShareNow[] = [];
  for (const [item, body] of now.items) {
    if (body.method !== "share") continue;
    const members = shareMembers(body, now);
    const isRegrouped = !isTreeKept && !sameBody(shareMembers(body, was).toSorted(), members.toSorted());
    shares.push({ item, members, isRegrouped });
  }
  return shares;
}

/** Whether the same items stand in the same groups, and the same of them are savings. */
function sameTree(was: IndexedState, now: IndexedState): boolean {
  if (was.items.size !== now.items.size || was.groups.size !== now.groups.size) return false;
  for (const [item, { group, saving }] of now.items) {
    const earlier = was.items.get(item);
    if (earlier?.group !== group || earlier.saving !== saving) return false;
  }
  for (const [group, { parent }] of now.groups) if (was.groups.get(group)?.parent !== parent) return false;
  return true;
}

/** What an item reads besides the results of others. */
function isMovedItself(item: string, was: IndexedState, now: IndexedState): boolean {
  const earlier = was.items.get(item);
  const body = now.items.get(item);
  if (!earlier || !body || !sameBody(earlier, body)) return true;
  return was.terms.growthTable[body.grade] !== now.terms.growthTable[body.grade] || readsMovedLine(body, was, now);
}

/** Items that others bring other notes to than before: only one with neighbours on a side can be such. */
function itemsWithOtherNotes(was: IndexedState, now: IndexedState): string[] {
  const candidates = new Set([...itemsWithNeighbours(was.items), ...itemsWithNeighbours(now.items)]);
  return [...candidates].filter((item) => {
    const earlier = was.items.get(item);
    const body = now.items.get(item);
    return earlier && body && !sameBody(lineNotes(item, earlier, was.items), lineNotes(item, body, now.items));
  });
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

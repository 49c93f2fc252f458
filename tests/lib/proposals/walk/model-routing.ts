import { predicted, type ModelBudget, type ModelContent } from "./model-budget";
import type { Model } from "./model-state";

const WINDOW_DAYS = 30;
const MORE: readonly string[] = ["add", "retire", "reinstate", "limit", "reserve"];

/** By the default review rules: for allocations alone, or for more. */
export function managerIsAsked(model: Model, before: ModelBudget, after: ModelBudget, content: ModelContent) {
  const rise = predicted(after) - predicted(before);
  const share = (newtons: number) => newtons > 0 && newtons * 100 >= after.limit;
  const items = content.edits.flatMap((edit) => ("item" in edit ? [edit.item] : []));
  const risesTooMuch =
    share(rise) || (rise > 0 && share(rise + items.reduce((sum, item) => sum + recent(model, item), 0)));
  return {
    forAllocations: content.transfers.length > 0 || sheetMoves(before, after),
    forMore: content.edits.some(({ what }) => MORE.includes(what)) || risesTooMuch || standsWorse(before, after),
  };
}

/** The net of what was approved for an item in thirty days, since a program manager last signed a move of it. */
function recent({ moves, day }: Model, item: string): number {
  const own = moves.filter((move) => move.item === item && day - move.day < WINDOW_DAYS);
  const signed = own.filter(({ managerSigned }) => managerSigned).map(({ issue: number }) => number);
  return own.filter((move) => move.issue > Math.max(0, ...signed)).reduce((sum, { by }) => sum + by, 0);
}

function standsWorse(before: ModelBudget, after: ModelBudget): boolean {
  const [was, now] = [before, after].map((budget) => {
    const margin = budget.limit - predicted(budget);
    return { margin, rank: margin >= budget.reserve ? 0 : margin >= 0 ? 1 : 2 };
  });
  if (!was || !now) return false;
  return now.rank > was.rank || (now.rank > 0 && now.margin < was.margin);
}

function sheetMoves(before: ModelBudget, after: ModelBudget): boolean {
  const isRegrouped = Object.entries(before.items).some(([item, { group }]) => after.items[item]?.group !== group);
  const isNested = Object.entries(before.groups).some(([group, { parent }]) => after.groups[group]?.parent !== parent);
  const sheet = ({ rows, unallocated, limit, reserve }: ModelBudget) =>
    JSON.stringify([Object.entries(rows).sort(), unallocated, limit, reserve]);
  return isRegrouped || isNested || sheet(before) !== sheet(after);
}

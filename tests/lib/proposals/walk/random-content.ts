import type { Dice } from "./dice";
import {
  applied,
  type ModelBudget,
  type ModelContent,
  type ModelEdit,
  type ModelHolder,
  type ModelTransfer,
} from "./model-budget";
import { newest, PEOPLE, ROLES, type Model } from "./model-state";

const UNALLOCATED: ModelHolder = { kind: "unallocated", number: null };
const OWNERS = PEOPLE.filter((who) => ROLES[who]?.some((role) => role === "owner" || role === "manager"));

/** Mostly a change that today's budget can take; else any, allowed or not, complete or not. */
export function randomContent(model: Model, dice: Dice, who: string): ModelContent {
  const tries = Array.from({ length: 6 }, () => anyContent(model, dice, who));
  const sound = dice.below(4) > 0 ? tries.find((content) => applied(newest(model), content)) : undefined;
  return sound ?? dice.one(tries);
}

/** Its proposer's own items come up most often. */
function anyContent(model: Model, dice: Dice, who: string): ModelContent {
  const budget = newest(model);
  const edits = Array.from({ length: dice.one([0, 1, 1, 1, 2]) }, () => randomEdit(model, budget, dice, who));
  const transfers = Array.from({ length: dice.one([0, 0, 0, 1, 2]) }, () => randomTransfer(budget, dice, edits));
  return { edits, transfers };
}

function randomEdit(model: Model, budget: ModelBudget, dice: Dice, who: string): ModelEdit {
  const items = Object.keys(budget.items);
  const own = items.filter((number) => budget.items[number]?.owner === who);
  const item = dice.one(own.length > 0 && dice.below(3) > 0 ? own : items);
  const known = budget.items[item];
  const bodyOwner = known?.owner ?? "";
  const sign = known?.saving ? -1 : 1;
  const group = dice.one([null, ...Object.keys(budget.groups)]);
  const size = 5 * (1 + dice.below(700));
  const nearby = Math.max(5, Math.abs(known?.force ?? 0) + 5 * (dice.below(13) - 6));
  const saving = dice.below(4) === 0;
  const edits: ModelEdit[] = [
    { what: "force", item, to: sign * nearby, bodyOwner },
    { what: "force", item, to: sign * nearby, bodyOwner },
    { what: "force", item, to: sign * nearby, bodyOwner },
    { what: "force", item, to: sign * size, bodyOwner },
    { what: "owner", item, to: dice.one(OWNERS), bodyOwner },
    { what: "group", item, to: group, bodyOwner },
    { what: "add", item: freshNumber(model), body: { owner: who, force: saving ? -size : size, group, saving } },
    { what: known?.retired ? "reinstate" : "retire", item },
    { what: dice.one(["retire", "reinstate"] as const), item },
    { what: "parent", group: dice.one(Object.keys(budget.groups)), to: group },
    { what: "limit", to: 8000 + 100 * dice.below(60) },
    { what: "reserve", to: 100 * dice.below(25) },
  ];
  return dice.one(edits);
}

/** Numbers are never used again, not even those of a draft: the next one that nobody has typed. */
function freshNumber({ issues, proposals }: Model): string {
  const typed = proposals.flatMap(({ everTyped }) => everTyped);
  return String(
    Math.max(100, ...typed.map(Number), ...issues.flatMap(({ items }) => Object.keys(items).map(Number))) + 10,
  );
}

function randomTransfer(budget: ModelBudget, dice: Dice, edits: readonly ModelEdit[]): ModelTransfer {
  const added = edits.flatMap((edit) => (edit.what === "add" ? [edit.item] : []));
  const holders: ModelHolder[] = [
    UNALLOCATED,
    UNALLOCATED,
    ...[...Object.keys(budget.items), ...added].map((number) => ({ kind: "item" as const, number })),
    ...Object.keys(budget.groups).map((number) => ({ kind: "group" as const, number })),
  ];
  return {
    giver: dice.one(holders),
    receiver: dice.one(holders),
    hundredths: 1 + dice.below(dice.one([50, 900, 4000])),
  };
}

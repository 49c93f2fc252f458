import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { addItem, fixedItem } from "@/tests/support/budget-on-file";
import { applied, type ModelBudget, type ModelItem, type ModelTransfer } from "./model-budget";
import type { Model } from "./model-state";

/** What a walk begins with, told twice: once to the model, once to the product. Hundredths of a newton. */
export const LIMIT = 10_000;
export const RESERVE = 1_000;

const ITEMS: Record<string, Pick<ModelItem, "owner" | "force" | "group" | "saving">> = {
  "010": { owner: "tansy", force: 1500, group: "G10", saving: false },
  "020": { owner: "odo", force: 2000, group: "G20", saving: false },
  "030": { owner: "roel", force: -300, group: null, saving: true },
  "040": { owner: "tansy", force: 2500, group: null, saving: false },
};
const GROUPS: Record<string, string | null> = { G10: null, G20: "G10" };
const unallocated = { kind: "unallocated", number: null } as const;
const TRANSFERS: ModelTransfer[] = [
  { giver: unallocated, receiver: { kind: "group", number: "G10" }, hundredths: 3000 },
  { giver: { kind: "group", number: "G10" }, receiver: { kind: "item", number: "020" }, hundredths: 1200 },
  { giver: unallocated, receiver: { kind: "item", number: "040" }, hundredths: 2000 },
  { giver: { kind: "item", number: "030" }, receiver: unallocated, hundredths: 200 },
];

export function firstModel(): Model {
  const lines: ModelBudget = {
    items: Object.fromEntries(
      Object.entries(ITEMS).map(([number, item]) => [number, { ...item, retired: false, revision: 0 }]),
    ),
    groups: Object.fromEntries(Object.entries(GROUPS).map(([number, parent]) => [number, { parent, revision: 0 }])),
    ...{ limit: LIMIT, reserve: RESERVE, revisions: { point: 0, terms: 0 }, rows: {}, unallocated: LIMIT - RESERVE },
  };
  const allocated = applied(lines, { edits: [], transfers: TRANSFERS });
  if (!allocated) throw new Error("the walk does not begin on a sound sheet");
  const empty = { ...lines, items: {}, groups: {} };
  // The first issues lie further back than any window.
  return { day: 0, issues: [empty, allocated], proposals: [], moves: [] };
}

export function firstChange(ids: Record<string, number>): { edits: LineEdit[]; transfers: ModelTransfer[] } {
  const groups = Object.entries(GROUPS).map(([number, parent], order): LineEdit => ({
    ...{ operation: "add", kind: "group", number, baseLetter: null },
    body: { name: `Group ${number}`, parent, order },
  }));
  const items = Object.entries(ITEMS).map(([number, { owner, force, group, saving }]) =>
    addItem(number, fixedItem(ids[owner] ?? 0, force / 100, { group, saving })),
  );
  return { edits: [...groups, ...items], transfers: TRANSFERS };
}

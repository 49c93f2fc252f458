import { z } from "zod";

import { asRecord, type Body, type Json } from "@/app/_components/line-fields/body";
import { FIRST_METHOD_VERSION } from "@/lib/evaluation/methods/method-versions";
import { FINISH_CATALOGUE } from "@/lib/products/finish-catalogue";
import type { DraftEdit } from "@/lib/proposals/schema";

import { askedItemFields, type TrialSetting } from "./setting";

const TargetItem = z.object({
  number: z.string(),
  name: z.string(),
  letter: z.string(),
  body: z.record(z.string(), z.json()),
});
export type TargetItem = z.infer<typeof TargetItem>;

/** What a trial can become in one product: the items that a person may revise, and what a new one needs. */
export const TrialTargets = z.object({
  userId: z.number(),
  items: z.array(TargetItem),
  /** Numbers of items that stand or stood. */
  taken: z.array(z.string()),
  nextOrder: z.number(),
  /** By which version of a method a new item there is computed. */
  versions: z.record(z.string(), z.number()),
  finishes: z.array(z.object({ number: z.string(), roughness: z.number() })),
});
export type TrialTargets = z.infer<typeof TrialTargets>;

/** The setting as a new item of a budget. */
export function newItemEdit(
  setting: TrialSetting,
  { number, name }: { number: string; name: string },
  targets: TrialTargets,
): DraftEdit {
  const own = { name, ownerId: targets.userId, order: targets.nextOrder };
  const body = { ...setting.item, ...own, methodVersion: versionIn(targets, setting.item) };
  return { operation: "add", kind: "item", number, baseLetter: null, body: { ...body, ...surface(setting, targets) } };
}

/** Chosen by the trial though no form of it asks: a run-up that is typed doesn't follow another item. */
const DECIDED = ["method", "runUpFollows"];

/** The setting as a revision: what the trial doesn't ask stays as the item has it. */
export function revisedItemEdit(setting: TrialSetting, item: TargetItem, targets: TrialTargets): DraftEdit {
  const asked = [...askedItemFields(setting.item).map(({ key }) => key), ...DECIDED];
  const body = Object.fromEntries(
    Object.entries(setting.item).map(([key, typed]) => [
      key,
      asked.includes(key) ? typed : kept(key, item.body, typed),
    ]),
  );
  // Only a proposal that says so moves an item to another version of its method.
  const isSameMethod = setting.item.method === item.body.method;
  const methodVersion = isSameMethod ? (item.body.methodVersion ?? null) : versionIn(targets, setting.item);
  return {
    operation: "revise",
    kind: "item",
    number: item.number,
    baseLetter: item.letter,
    body: { ...body, methodVersion, ...surface(setting, targets) },
  };
}

function versionIn({ versions }: TrialTargets, { method }: Body): number {
  return versions[String(method)] ?? FIRST_METHOD_VERSION;
}

/** A source that a choice of the trial brought (a catalogued shape) goes with its coefficient. */
function kept(key: string, body: Body, typed: Json): Json {
  if (key === "source" && typed !== "") return typed;
  return body[key] ?? typed;
}

/** A finish of the trial's catalogue, by its number where the product has the same one, else by its roughness. */
function surface({ item }: TrialSetting, { finishes }: TrialTargets): Body {
  if (typeof item.finish !== "string") return {};
  const roughness = FINISH_CATALOGUE.find(({ number }) => number === item.finish)?.body.roughness;
  if (!roughness) return {};
  const isSame = finishes.some((finish) => finish.number === item.finish && finish.roughness === roughness.value);
  return isSame ? {} : { finish: null, roughness: asRecord(roughness) };
}

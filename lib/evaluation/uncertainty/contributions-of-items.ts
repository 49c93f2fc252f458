import { slope } from "../methods/sensitivity";
import { streamStateOf, type StreamState } from "../methods/stream-state";
import type { BudgetModel, FormulaItem, ShareItem } from "./budget-model";
import { fillSlots, type Slot } from "./slot";

/** What each cause does to an item's basic estimate: slope times standard uncertainty, signed, N, by place of the cause. */
export type ItemContributions = ReadonlyMap<number, number>;

/** The contributions to every item of the model, in its order. One cause adds up over items: that is their covariance. */
export function contributionsOfItems(model: BudgetModel): ItemContributions[] {
  const contributions: ItemContributions[] = [];
  for (const item of model.items) {
    contributions.push(item.kind === "share" ? ofShare(item, model, contributions) : ofFormula(item, model));
  }
  return contributions;
}

function ofFormula(item: FormulaItem, model: BudgetModel): ItemContributions {
  const { causes, stream } = model;
  const found = new Map<number, number>();
  const nominal = streamStateOf(stream.input);
  const pointPlaces = placesOf(stream.slots);
  for (const place of new Set([...pointPlaces, ...placesOf(item.slots)])) {
    const cause = causes[place];
    if (cause)
      found.set(
        place,
        slopeOf(place, item, model, pointPlaces.has(place) ? null : nominal) * cause.standardUncertainty,
      );
  }
  addBiases(item.biases, item.basic, model, found);
  return found;
}

/** @param nominal the stream where the cause leaves it alone; null where it has to be made anew */
function slopeOf(place: number, item: FormulaItem, model: BudgetModel, nominal: StreamState | null): number {
  const { causes, stream } = model;
  const cause = causes[place];
  if (!cause) return 0;
  const deviations = new Float64Array(causes.length);
  const setTo = (value: number): void => {
    deviations[place] = value - cause.value;
    fillSlots(item.slots, deviations);
    if (!nominal) fillSlots(stream.slots, deviations);
  };
  const found = slope(cause, (value) => {
    if (value < cause.lowest || value > cause.highest) return null;
    setTo(value);
    const here = nominal ?? streamStateOf(stream.input);
    const newtons = item.force.newtons(here);
    return Number.isFinite(newtons) ? { newtons, regime: item.force.regime(here) } : null;
  });
  setTo(cause.value);
  return found;
}

function ofShare(item: ShareItem, model: BudgetModel, contributions: readonly ItemContributions[]): ItemContributions {
  const found = new Map<number, number>();
  for (const member of item.members) {
    for (const [place, newtons] of contributions[member] ?? []) add(found, place, item.fraction * newtons);
  }
  if (item.fractionPlace !== null) {
    const sum = item.members.reduce((total, member) => total + (model.items[member]?.basic ?? 0), 0);
    add(found, item.fractionPlace, sum * (model.causes[item.fractionPlace]?.standardUncertainty ?? 0));
  }
  addBiases(item.biases, item.basic, model, found);
  return found;
}

function addBiases(
  biases: readonly number[],
  basic: number,
  { causes }: BudgetModel,
  found: Map<number, number>,
): void {
  for (const place of biases) add(found, place, basic * (causes[place]?.standardUncertainty ?? 0));
}

function add(found: Map<number, number>, place: number, newtons: number): void {
  found.set(place, (found.get(place) ?? 0) + newtons);
}

function placesOf(slots: readonly Slot[]): ReadonlySet<number> {
  return new Set(slots.flatMap(({ causes }) => causes));
}

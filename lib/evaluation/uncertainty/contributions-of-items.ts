import { slope, type Reading } from "../methods/sensitivity";
import { streamStateOf, type StreamState } from "../methods/stream-state";
import type { BudgetModel, FormulaItem, ShareItem } from "./budget-model";
import type { Cause } from "./cause";
import { fillSlots, type Slot } from "./slot";

/** What each cause does to an item's basic estimate: slope times standard uncertainty, signed, N, by place of the cause. */
export type ItemContributions = ReadonlyMap<number, number>;

/** The contributions to every item of the model, in its order. One cause adds up over items: that is their covariance. */
export function contributionsOfItems(model: BudgetModel): ItemContributions[] {
  const probe = probeOf(model);
  const contributions: ItemContributions[] = [];
  for (const item of model.items) {
    contributions.push(item.kind === "share" ? ofShare(item, model, contributions) : ofFormula(item, model, probe));
  }
  return contributions;
}

/** What the items are tried with, made once for all of them: the streams that the causes of the point give. */
interface Probe {
  pointPlaces: ReadonlySet<number>;
  nominal: StreamState;
  streamAt(place: number, value: number): StreamState;
  /** All 0 between two trials. */
  deviations: Float64Array;
}

function probeOf({ causes, stream }: BudgetModel): Probe {
  const deviations = new Float64Array(causes.length);
  const streams = new Map<string, StreamState>();
  const streamAt = (place: number, value: number): StreamState => {
    const key = `${place} ${value}`;
    const known = streams.get(key);
    if (known) return known;
    deviations[place] = value - (causes[place]?.value ?? 0);
    fillSlots(stream.slots, deviations);
    const state = streamStateOf(stream.input);
    deviations[place] = 0;
    fillSlots(stream.slots, deviations);
    streams.set(key, state);
    return state;
  };
  return { pointPlaces: placesOf(stream.slots), nominal: streamStateOf(stream.input), streamAt, deviations };
}

function ofFormula(item: FormulaItem, model: BudgetModel, probe: Probe): ItemContributions {
  const found = new Map<number, number>();
  const own = placesOf(item.slots);
  const centre = { newtons: item.force.newtons(probe.nominal), regime: item.force.regime(probe.nominal) };
  for (const place of new Set([...probe.pointPlaces, ...own])) {
    const cause = model.causes[place];
    if (!cause) continue;
    const readAt = own.has(place) ? ownReading(place, cause, item, probe) : streamReading(place, item, probe);
    const slopeHere = slope(cause, (value) => {
      if (value === cause.value) return Number.isFinite(centre.newtons) ? centre : null;
      return value < cause.lowest || value > cause.highest ? null : readAt(value);
    });
    found.set(place, slopeHere * cause.standardUncertainty);
  }
  addBiases(item.biases, item.basic, model, found);
  return found;
}

/** The item in the stream that one cause of the operating point gives. */
function streamReading(place: number, item: FormulaItem, probe: Probe): (value: number) => Reading | null {
  return (value) => readingIn(item, probe.streamAt(place, value));
}

/** The item with one of its own numbers at another value. */
function ownReading(place: number, cause: Cause, item: FormulaItem, probe: Probe): (value: number) => Reading | null {
  return (value) => {
    probe.deviations[place] = value - cause.value;
    fillSlots(item.slots, probe.deviations);
    const reading = readingIn(item, probe.nominal);
    probe.deviations[place] = 0;
    fillSlots(item.slots, probe.deviations);
    return reading;
  };
}

function readingIn({ force }: FormulaItem, stream: StreamState): Reading | null {
  const newtons = force.newtons(stream);
  return Number.isFinite(newtons) ? { newtons, regime: force.regime(stream) } : null;
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

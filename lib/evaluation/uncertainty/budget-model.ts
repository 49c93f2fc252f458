import { indexState, type IndexedState } from "../budget/indexed-state";
import { methodInputOf, streamInputOf } from "../budget/method-input";
import type { ItemResult, PointResult } from "../budget/results";
import { shareMembers } from "../budget/share-members";
import type { UncertainNumber } from "../document/number-input";
import type { FluidInput } from "../document/schema";
import type { ItemBody } from "../lines/item-body";
import type { BudgetState } from "../lines/line-state";
import { OWN_UNCERTAINTIES } from "../methods/own-uncertainties";
import { uncertainNumbers } from "../methods/uncertain-numbers";
import { CauseList, type Cause, type CauseSketch } from "./cause";
import { itemForce, type ItemForce } from "./item-force";
import { inputCause, limitsOf, runUpCauses } from "./item-causes";
import type { Slot } from "./slot";

interface ModelItemHead {
  item: string;
  growthFraction: number;
  /** N, with every cause at its value. */
  basic: number;
  /** Places of the factors that its friction line and its method bring. */
  biases: readonly number[];
}

export interface FormulaItem extends ModelItemHead {
  kind: "formula";
  force: ItemForce;
  slots: readonly Slot[];
}

export interface ShareItem extends ModelItemHead {
  kind: "share";
  fraction: number;
  /** Place of the fraction's own cause; null where it is exact. */
  fractionPlace: number | null;
  /** Places of its members among the items of the model. */
  members: readonly number[];
}

export type ModelItem = FormulaItem | ShareItem;

/** A budget at one operating point as a function of everything in it that is uncertain. */
export interface BudgetModel {
  operatingPoint: string;
  /** N */
  limit: number;
  causes: readonly Cause[];
  stream: { input: FluidInput; slots: readonly Slot[] };
  /** A share stands after its members. */
  items: readonly ModelItem[];
}

/** The items that have no result at the point: without them there is no sum to be uncertain about. */
export interface RefusedModel {
  refused: string[];
}

/** Versions of the combination of uncertainties that the terms may name. */
const UNCERTAINTY_VERSION = 1;

/** @param point the results at the operating point, computed from that very state */
export function budgetModel(state: BudgetState, point: PointResult): BudgetModel | RefusedModel {
  const indexed = indexState(state);
  const { uncertaintyVersion } = indexed.terms;
  if (uncertaintyVersion !== UNCERTAINTY_VERSION)
    throw new RangeError(`no uncertainty of version ${uncertaintyVersion}`);
  const refused = point.items.filter((result) => result.refused !== null).map(({ item }) => item);
  if (refused.length > 0) return { refused };

  const list = new CauseList();
  const stream = streamOf(point.operatingPoint, indexed, list);
  const building: Building = {
    state: indexed,
    list,
    results: new Map(point.items.map((result) => [result.item, result])),
    places: new Map(),
    items: [],
  };
  for (const { item } of point.items) placeOfItem(item, building);
  const { operatingPoint, limitHundredths } = point;
  return { operatingPoint, limit: limitHundredths / 100, causes: list.causes, stream, items: building.items };
}

interface Building {
  state: IndexedState;
  list: CauseList;
  results: ReadonlyMap<string, ItemResult>;
  places: Map<string, number>;
  items: ModelItem[];
}

function streamOf(number: string, { operatingPoints }: IndexedState, list: CauseList): BudgetModel["stream"] {
  const body = operatingPoints.get(number);
  if (!body) throw new RangeError(`no operating point ${number} in force`);
  const input = streamInputOf(body);
  const slots = uncertainNumbers(input).flatMap(({ path, number: target }) =>
    slotsFor(target, { origin: "operating_point", name: number, field: path, ...limitsOf(path, false) }, list),
  );
  return { input, slots };
}

function placeOfItem(item: string, building: Building): number {
  const known = building.places.get(item);
  if (known !== undefined) return known;
  const body = building.state.items.get(item);
  const result = building.results.get(item);
  if (!body || !result) throw new RangeError(`item ${item} has no result`);
  const built =
    body.method === "share" ? shareItem(item, body, result, building) : formulaItem(item, body, result, building);
  const place = building.items.push(built) - 1;
  building.places.set(item, place);
  return place;
}

type Share = Extract<ItemBody, { method: "share" }>;

function shareItem(item: string, body: Share, result: ItemResult, building: Building): ShareItem {
  const members = shareMembers(body, building.state).map((member) => placeOfItem(member, building));
  const standardUncertainty = body.coefficientUncertainty ?? 0;
  const cause = { origin: "item", name: item, field: "fraction", lowest: 0, highest: 1 } as const;
  const fractionPlace =
    standardUncertainty > 0 ? building.list.place({ ...cause, value: body.fraction, standardUncertainty }) : null;
  return { kind: "share", ...headOf(item, body, result, building), fraction: body.fraction, fractionPlace, members };
}

function formulaItem(
  item: string,
  body: Exclude<ItemBody, Share>,
  result: ItemResult,
  building: Building,
): FormulaItem {
  const { state, list } = building;
  const input = methodInputOf(body, state);
  const slots = uncertainNumbers(input).flatMap(({ path, number }) =>
    slotsFor(number, inputCause(item, body, path), list),
  );
  if (input.method === "flat-plate-friction" && body.method === "flat-plate-friction" && body.runUpFollows) {
    const places = runUpCauses(body, item, state.items).map((cause) => list.place(cause));
    if (places.length > 0 && typeof input.runUp === "number") {
      const target = { value: input.runUp, standardUncertainty: 0 };
      slots.push({ target, nominal: input.runUp, causes: places });
      input.runUp = target;
    }
  }
  const area = ductArea(result, state);
  if (area)
    slots.push(
      ...slotsFor(area, { origin: "terms", name: "TM", field: "flowArea", ...limitsOf("flowArea", false) }, list),
    );
  return {
    kind: "formula",
    ...headOf(item, body, result, building),
    force: itemForce(body.methodVersion, input, area),
    slots,
  };
}

/** The area on which a duct's pressure losses count; null for what has none and outside ducts. */
function ductArea({ answer }: ItemResult, { product, terms }: IndexedState): UncertainNumber | null {
  if (product.kind !== "duct" || answer?.pressureLoss === undefined || terms.flowArea === null) return null;
  return { value: terms.flowArea.value, standardUncertainty: terms.flowArea.standardUncertainty ?? 0 };
}

function slotsFor(
  target: UncertainNumber,
  cause: Omit<CauseSketch, "value" | "standardUncertainty">,
  list: CauseList,
): Slot[] {
  if (target.standardUncertainty === 0) return [];
  return [{ target, nominal: target.value, causes: [list.place({ ...cause, ...target })] }];
}

/** A bias belongs to the line that gives the answer: it is kept where a draw would go over to another line. */
function headOf(item: string, { method }: ItemBody, result: ItemResult, { list }: Building): ModelItemHead {
  const { basic, growthFraction, answer } = result;
  const names = answer?.frictionLineUsed ? [answer.frictionLineUsed, method] : [method];
  return { item, basic, growthFraction, biases: names.flatMap((name) => biasPlaces(name, list)) };
}

function biasPlaces(name: keyof typeof OWN_UNCERTAINTIES, list: CauseList): number[] {
  const { relative } = OWN_UNCERTAINTIES[name];
  if (relative === 0) return [];
  const factor = { value: 1, standardUncertainty: relative, lowest: 0, highest: Infinity };
  return [list.place({ origin: "method", name, field: null, ...factor })];
}

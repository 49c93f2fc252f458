import { roundStored } from "@/lib/units/rounding";
import type { ItemBody } from "../lines/item-body";
import type { MethodAnswer, MethodOutcome } from "../methods/method-answer";
import { evaluateMethod } from "../methods/method-registry";
import type { StreamState } from "../methods/stream-state";
import type { Note } from "../notes/note";
import { makeNote } from "../notes/note-catalogue";
import type { IndexedState } from "./indexed-state";
import { lineNotes } from "./line-notes";
import { methodInputOf } from "./method-input";
import { oncePer } from "./once-per";
import type { ItemResult } from "./results";
import { roundAnswer, roundNote } from "./round-answer";
import { shareMembers } from "./share-members";
import { itemsInSheetOrder } from "./sheet-order";

export interface PointToEvaluate {
  operatingPoint: string;
  stream: StreamState;
  /** A frozen result that holds as it is; undefined where the item has to be computed. */
  frozen: (item: string) => ItemResult | undefined;
}

/** Every item at one operating point, in the order of the sheet. */
export function evaluatePoint(point: PointToEvaluate, state: IndexedState): ItemResult[] {
  const evaluation: Evaluation = { point, state, results: new Map(), open: [] };
  return orderOf(state).map((item) => evaluate(item, evaluation));
}

/** The same at every operating point. */
const orderOf = oncePer(itemsInSheetOrder);

interface Evaluation {
  point: PointToEvaluate;
  state: IndexedState;
  /** What was computed so far. */
  results: Map<string, ItemResult>;
  /** Shares whose members are being added up: meeting one of them again is a circle. */
  open: string[];
}

function evaluate(item: string, evaluation: Evaluation): ItemResult {
  const known = evaluation.point.frozen(item) ?? evaluation.results.get(item);
  if (known) return known;
  const result = compute(item, evaluation);
  evaluation.results.set(item, result);
  return result;
}

function compute(item: string, evaluation: Evaluation): ItemResult {
  const { state, point } = evaluation;
  const body = state.items.get(item);
  if (!body) throw new RangeError(`no item ${item} in force`);

  const outcome =
    body.method === "share"
      ? shareOutcome(item, body, evaluation)
      : evaluateMethod(body.method, body.methodVersion, methodInputOf(body, state), point.stream);
  return toResult(item, body, outcome, evaluation);
}

type Share = Extract<ItemBody, { method: "share" }>;

/** A fraction of the sum of its members' basic estimates at the same operating point. */
function shareOutcome(item: string, share: Share, evaluation: Evaluation): MethodOutcome {
  const { open } = evaluation;
  if (open.includes(item)) {
    const circle = [...open.slice(open.indexOf(item)), item].join(" → ");
    return { outcome: "refused", note: makeNote("share-circle", { circle }) };
  }

  open.push(item);
  const members = shareMembers(share, evaluation.state).map((member) => evaluate(member, evaluation));
  open.pop();
  const refused = members.find((member) => member.refused !== null);
  if (refused) return { outcome: "refused", note: refusalThrough(refused) };

  const sum = members.reduce((total, member) => total + member.basic, 0);
  return { outcome: "answer", answer: { drag: share.fraction * sum, notes: [] } };
}

/** Every share of a circle tells the circle; one outside it tells the member that is refused. */
function refusalThrough(member: ItemResult): Note {
  const isCircle = member.refused?.code === "share-circle";
  return isCircle && member.refused ? member.refused : makeNote("share-of-refused", { item: member.item });
}

function toResult(item: string, body: ItemBody, outcome: MethodOutcome, { point, state }: Evaluation): ItemResult {
  const { operatingPoint } = point;
  const { methodVersion } = body;
  const growthFraction = state.terms.growthTable[body.grade];
  if (outcome.outcome === "refused") {
    const refused = roundNote(outcome.note);
    const nothing = { basic: 0, growthFraction, growth: 0, predicted: 0, answer: null };
    return { item, operatingPoint, methodVersion, ...nothing, notes: [refused], refused };
  }

  const answer = roundAnswer(outcome.answer);
  const basic = roundStored(basicEstimate(outcome.answer, state));
  const growth = roundStored(Math.abs(basic) * growthFraction);
  const predicted = roundStored(basic + growth);
  const fromOthers = lineNotes(item, body, state.items).map((note) =>
    withOnePlateValue(note, body, { basic, point, state }),
  );
  const notes = [...answer.notes, ...fromOthers.map(roundNote)];
  return {
    item,
    operatingPoint,
    methodVersion,
    basic,
    growthFraction,
    growth,
    predicted,
    answer,
    notes,
    refused: null,
  };
}

/** A plate that starts anew with another ahead of it: what it has, beside what it would have as the rest of one plate. */
function withOnePlateValue(
  note: Note,
  body: ItemBody,
  { basic, point, state }: { basic: number; point: PointToEvaluate; state: IndexedState },
): Note {
  const { runUp } = note.values;
  if (body.method !== "flat-plate-friction" || typeof runUp !== "number") return note;

  const onward = methodInputOf({ ...body, runUpFollows: false, runUp: { ...body.runUp, value: runUp } }, state);
  const outcome = evaluateMethod(body.method, body.methodVersion, onward, point.stream);
  if (outcome.outcome === "refused") return note;
  return { ...note, values: { ...note.values, alone: basic, onePlate: basicEstimate(outcome.answer, state) } };
}

/** In a duct a loss counts on the flow area of the product, whatever the item's own section, so that pascals add up. */
function basicEstimate(answer: MethodAnswer, { product, terms }: IndexedState): number {
  if (product.kind !== "duct" || answer.pressureLoss === undefined || terms.flowArea === null) return answer.drag;
  return answer.pressureLoss * terms.flowArea.value;
}

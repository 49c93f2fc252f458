import { contributionsOf, standardUncertaintyOf, type Contributions } from "../methods/contributions";
import type { MethodAnswer } from "../methods/method-answer";
import { evaluateMethod } from "../methods/method-registry";
import { FIRST_METHOD_VERSION } from "../methods/method-versions";
import { OWN_UNCERTAINTIES } from "../methods/own-uncertainties";
import { streamStateOf, type StreamState } from "../methods/stream-state";
import type { Note } from "../notes/note";
import { makeNote, noteSentence } from "../notes/note-catalogue";
import type { EvaluationAnswer, ItemAnswer, OperatingPointAnswer } from "./answer";
import { numberOf, uncertaintyOf } from "./number-input";
import type { EvaluationDocument, ItemInput, OperatingPointInput } from "./schema";
import { membersOf, shareOrder, type ShareOrder } from "./share-order";

type ItemOutcome = { answer: MethodAnswer; contributions: Contributions } | { refusedBy: Note };

/** Every item at every operating point, in the order given. */
export function evaluateDocument({ operatingPoints, items }: EvaluationDocument): EvaluationAnswer {
  const order = shareOrder(items);
  return { operatingPoints: operatingPoints.map((point) => evaluatePoint(point, items, order)) };
}

function evaluatePoint(
  point: OperatingPointInput,
  items: readonly ItemInput[],
  { ordered, circles, stuck }: ShareOrder,
): OperatingPointAnswer {
  const stream = streamStateOf(point);
  const outcomes = new Map<string, ItemOutcome>();
  for (const [id, circle] of circles) outcomes.set(id, { refusedBy: makeNote("share-circle", { circle }) });
  for (const item of ordered) {
    outcomes.set(
      item.id,
      item.method === "share" ? shareOutcome(item, items, outcomes) : itemOutcome(item, point, stream),
    );
  }
  for (const item of stuck) {
    const refused = membersOf(item, items).find((id) => isRefused(outcomes.get(id))) ?? item.id;
    outcomes.set(item.id, { refusedBy: makeNote("share-of-refused", { item: refused }) });
  }
  return pointAnswer(point.id, stream, items, outcomes);
}

function itemOutcome(item: ItemInput, point: OperatingPointInput, stream: StreamState): ItemOutcome {
  const outcome = evaluateMethod(item.method, FIRST_METHOD_VERSION, item, stream);
  if (outcome.outcome === "refused") return { refusedBy: outcome.note };
  const { answer } = outcome;
  return { answer, contributions: contributionsOf(item.id, FIRST_METHOD_VERSION, item, point, answer) };
}

function shareOutcome(
  item: Extract<ItemInput, { method: "share" }>,
  items: readonly ItemInput[],
  outcomes: ReadonlyMap<string, ItemOutcome>,
): ItemOutcome {
  const fraction = numberOf(item.fraction);
  const contributions = new Map<string, number>();
  let sum = 0;
  for (const id of membersOf(item, items)) {
    const member = outcomes.get(id);
    if (!member || "refusedBy" in member) return { refusedBy: makeNote("share-of-refused", { item: id }) };
    sum += member.answer.drag;
    for (const [source, newtons] of member.contributions) {
      contributions.set(source, (contributions.get(source) ?? 0) + fraction * newtons);
    }
  }
  const drag = fraction * sum;
  contributions.set(`item:${item.id}:fraction`, sum * uncertaintyOf(item.fraction));
  contributions.set("own:share", (contributions.get("own:share") ?? 0) + OWN_UNCERTAINTIES.share.relative * drag);
  return { answer: { drag, notes: [] }, contributions };
}

function pointAnswer(
  id: string,
  stream: StreamState,
  items: readonly ItemInput[],
  outcomes: ReadonlyMap<string, ItemOutcome>,
): OperatingPointAnswer {
  const { density, dynamicViscosity, kinematicViscosity, dynamicPressure } = stream;
  const answers = items.map((item) => shownAnswer(item.id, outcomes.get(item.id)));
  const answer = { id, density, dynamicViscosity, kinematicViscosity, dynamicPressure, items: answers };
  let totalDrag = 0;
  for (const item of answers) {
    if ("refused" in item) return answer;
    totalDrag += item.drag;
  }
  return { ...answer, totalDrag };
}

function shownAnswer(id: string, outcome: ItemOutcome | undefined): ItemAnswer {
  if (!outcome) throw new RangeError(`item ${id} was not evaluated`);
  if ("refusedBy" in outcome) return { id, refused: noteSentence(outcome.refusedBy) };
  const { notes, ...quantities } = outcome.answer;
  return {
    id,
    ...quantities,
    standardUncertainty: standardUncertaintyOf(outcome.contributions),
    notes: notes.map((note) => ({ code: note.code, severity: note.severity, sentence: noteSentence(note) })),
  };
}

function isRefused(outcome: ItemOutcome | undefined): boolean {
  return outcome === undefined || "refusedBy" in outcome;
}

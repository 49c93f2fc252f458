import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { Effects, ItemEffect } from "@/lib/evaluation/budget/effects";
import { effectsOf } from "@/lib/evaluation/budget/effects-of";
import { touchesOf } from "@/lib/evaluation/budget/touches";
import { effectBases } from "@/lib/evaluation/measures/effect-bases";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import type { Note } from "@/lib/evaluation/notes/note";
import { effectSentence } from "./effect-sentence";
import type { BudgetAtIssue } from "./preview-proposal";
import { touchSentence, touchTitle } from "./touch-text";
import type { EffectView, ItemEffectView, NoteView, TouchView } from "../views";

/** A change of a budget and what it leaves behind. */
export interface ChangeOnBudget {
  before: BudgetAtIssue;
  after: Pick<BudgetAtIssue, "state" | "results">;
  edits: readonly LineEdit[];
  effects: Effects;
}

/** The effect of a change on one issue, as a page shows it: the worst operating point first. */
export function effectView(change: ChangeOnBudget): EffectView {
  const { before, after, effects } = change;
  const { worstPoint } = after.results;
  const points = [...effects.points].sort(
    (one, other) => Number(other.operatingPoint === worstPoint) - Number(one.operatingPoint === worstPoint),
  );
  const names = namesOf(change);
  const touches = touchViews(change, names);
  // What a touch lists stands there with all that it reaches, and not a second time.
  const listed = new Set(touches.flatMap((touch) => touch.effects.map(keyOf)));
  const items = (part: readonly ItemEffect[]) =>
    part.map((effect) => itemView(effect, names)).filter((effect) => !listed.has(keyOf(effect)));
  const [worst] = points;
  return {
    onIssue: before.issue,
    bases: effectBases(before, after),
    points,
    edited: items(effects.items.filter(({ edited }) => edited)),
    followers: items(effects.followers),
    touches,
    sentence: worst ? effectSentence(worst) : "",
  };
}

function touchViews(
  { before, after, edits, effects }: ChangeOnBudget,
  names: ReadonlyMap<string, string>,
): TouchView[] {
  return touchesOf(before.state, after.state, edits).map((touch) => {
    const all = effectsOf(before.results, after.results, touch.items).items;
    return {
      title: touchTitle(touch),
      sentence: touchSentence(touch, effects.items),
      effects: all.filter(({ item }) => touch.items.includes(item)).map((effect) => itemView(effect, names)),
    };
  });
}

function namesOf({ before, after }: ChangeOnBudget): ReadonlyMap<string, string> {
  const lines = [...before.state.lines, ...after.state.lines];
  return new Map(lines.flatMap((line) => (line.kind === "item" ? [[line.number, line.body.name]] : [])));
}

function keyOf({ item, operatingPoint }: Pick<ItemEffectView, "item" | "operatingPoint">): string {
  return `${item} ${operatingPoint}`;
}

function itemView(effect: ItemEffect, names: ReadonlyMap<string, string>): ItemEffectView {
  return {
    item: effect.item,
    name: names.get(effect.item) ?? "",
    operatingPoint: effect.operatingPoint,
    predictedWas: effect.predictedWas,
    predictedNow: effect.predictedNow,
    delta: effect.predictedDelta,
    notesNew: effect.newNotes.map(noteView),
    notesVanished: effect.vanishedNotes.map(noteView),
  };
}

function noteView(note: Note): NoteView {
  return { code: note.code, severity: note.severity, sentence: noteSentence(note) };
}

import type { Effects, ItemEffect } from "@/lib/evaluation/budget/effects";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import type { Note } from "@/lib/evaluation/notes/note";
import { effectSentence } from "./effect-sentence";
import type { EffectView, ItemEffectView, NoteView } from "./views";

/** The effect of a change on one issue, as a page shows it: the worst operating point first. */
export function effectView(
  onIssue: number,
  effects: Effects,
  after: { state: BudgetState; results: BudgetResults },
): EffectView {
  const { worstPoint } = after.results;
  const points = [...effects.points].sort(
    (one, other) => Number(other.operatingPoint === worstPoint) - Number(one.operatingPoint === worstPoint),
  );
  const names = new Map(
    after.state.lines.flatMap((line) => (line.kind === "item" ? [[line.number, line.body.name]] : [])),
  );
  const items = (part: readonly ItemEffect[]) => part.map((effect) => itemView(effect, names.get(effect.item) ?? ""));
  const [worst] = points;
  return {
    onIssue,
    points,
    edited: items(effects.items.filter(({ edited }) => edited)),
    followers: items(effects.followers),
    sentence: worst ? effectSentence(worst) : "",
  };
}

function itemView(effect: ItemEffect, name: string): ItemEffectView {
  return {
    item: effect.item,
    name,
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

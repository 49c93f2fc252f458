import type { Effects, ItemEffect, PointEffect } from "@/lib/evaluation/budget/effects";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import type { Note } from "@/lib/evaluation/notes/note";
import { effectSentence } from "./effect-sentence";
import type { EffectView, ItemEffectView, NoteView, PointEffectView } from "./views";

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
    points: points.flatMap((point) => pointView(point) ?? []),
    edited: items(effects.items.filter(({ edited }) => edited)),
    followers: items(effects.followers),
    sentence: worst ? effectSentence(worst) : "",
  };
}

/** An operating point that stands on one side only shows the figures of that side on both. */
function pointView({ operatingPoint, name, was, now, predictedDelta }: PointEffect): PointEffectView | null {
  const before = was ?? now;
  const after = now ?? was;
  if (before === null || after === null) return null;
  return {
    operatingPoint,
    name,
    basicWas: before.basic,
    basicNow: after.basic,
    predictedWas: before.predicted,
    predictedNow: after.predicted,
    predictedDelta,
    limitWas: before.limitHundredths / 100,
    limitNow: after.limitHundredths / 100,
    reserveWas: before.reserveHundredths / 100,
    reserveNow: after.reserveHundredths / 100,
    marginWas: before.margin,
    marginNow: after.margin,
    standingWas: before.standing,
    standingNow: after.standing,
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

import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { fieldEffects, type LineEffect } from "@/lib/evaluation/budget/field-effects";
import type { BudgetAtIssue, ProposalPreview } from "./preview-proposal";
import { changedRows, lineChanges, type ChangedRow, type LineChange } from "./line-changes";
import { comparedText } from "./compared-text";
import type { SidesEffect } from "../sheet-views";
import type { FieldChangeRow, LineChangeView, RemarkView } from "../views";

interface ShownChange {
  edits: readonly LineEdit[];
  /** The issue that the change is shown against. */
  on: BudgetAtIssue;
  preview: ProposalPreview;
  base: BudgetAtIssue;
  today: BudgetAtIssue;
  remarks: readonly RemarkView[];
  people: ReadonlyMap<number, string>;
}

/** Every line that the change revises, field by field, with what each field brings at the worst operating point. */
export function lineViews({ edits, on, preview, base, today, remarks, people }: ShownChange): LineChangeView[] {
  const { after, changedLines } = preview.change;
  const { worstPoint } = after.results;
  return lineChanges(edits, on.state, after.state, changedLines, people).map((change) => {
    const { kind, number, name, operation, letterWas, letterNow } = change;
    const edit = edits.find((each) => each.kind === kind && each.number === number);
    const effectOn = ({ state, results }: BudgetAtIssue) =>
      edit ? fieldEffects(state, results, edit, worstPoint) : null;
    const onBase = effectOn(base);
    const effects = { onBase, onToday: today.issue === base.issue ? onBase : effectOn(today) };
    const todays = today.state.lines.find((line) => line.kind === kind && line.number === number);
    return {
      ...{ kind, number, name, operation, baseLetter: letterWas, nextLetter: letterNow },
      todayLetter: todays?.letter ?? null,
      rows: rowViews(change, effects, remarks),
      effect: {
        onBase: effects.onBase?.predictedDelta ?? null,
        onToday: effects.onToday?.predictedDelta ?? null,
      },
    };
  });
}

type Effects = Record<keyof SidesEffect, LineEffect | null>;

function rowViews(change: LineChange, effects: Effects, remarks: readonly RemarkView[]): FieldChangeRow[] {
  const rows = changedRows(change);
  const onBase = effectByRow(rows, effects.onBase);
  const onToday = effectByRow(rows, effects.onToday);
  const here = remarks.filter(({ line }) => line?.kind === change.kind && line.number === change.number);
  return rows.map((row) => ({
    ...row,
    effect: { onBase: onBase.get(row.field) ?? null, onToday: onToday.get(row.field) ?? null },
    compared: comparedText(row.was, row.toBe),
    remarkNumbers: here.filter(({ field }) => field === row.field).map(({ number }) => number),
  }));
}

/** The effect of a list or of another method counts once, at its first row that changed. */
function effectByRow(rows: readonly ChangedRow[], effect: LineEffect | null): Map<string, number> {
  const found = new Map<string, number>();
  for (const { field, predictedDelta } of effect?.fields ?? []) {
    const row =
      rows.find((each) => each.field === field) ??
      rows.find((each) => each.changed && each.field.startsWith(`${field}.`));
    if (row && predictedDelta !== null) found.set(row.field, (found.get(row.field) ?? 0) + predictedDelta);
  }
  return found;
}

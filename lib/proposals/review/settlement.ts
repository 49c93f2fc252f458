import { fieldsOfBody } from "@/lib/evaluation/lines/field-catalogue";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";
import { fieldText } from "@/lib/evaluation/lines/field-text";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { lineName, nameBookOf, type NameBook } from "@/lib/evaluation/lines/name-book";
import { LINE_KIND_NAMES, type LineKind } from "@/lib/vocabulary/lines";
import { mergedBody, mergeFields, type FieldMerge, type SettlementSide } from "../records/merge-fields";
import type { DraftEdit } from "../schema";
import type { SettlementRow } from "../workspace-views";

/** One edit of the working copy brought onto a newer issue. */
export interface CarriedEdit {
  edit: DraftEdit;
  merges: FieldMerge[];
  /** The line on the newer issue; null for a line that the proposal adds. */
  onto: LineState | null;
  /** Why it cannot be carried, as a sentence. */
  obstacle: string | null;
}

/** Sets every edit against what became of its line between the two issues. */
export function carriedEdits(base: BudgetState, onto: BudgetState, edits: readonly DraftEdit[]): CarriedEdit[] {
  return edits.map((edit) => {
    const was = find(base, edit.kind, edit.number);
    const now = find(onto, edit.kind, edit.number);
    if (!now) return { edit, merges: [], onto: null, obstacle: null };
    const theirs = recordOf(now.body);
    const merges = edit.body === null ? [] : mergeFields(recordOf(was?.body ?? {}), theirs, edit.body);
    return { edit, merges, onto: now, obstacle: obstacleOf(edit, now) };
  });
}

/** The edit as it stands on the newer issue, with the values that were settled. */
export function settledEdit(
  { edit, merges, onto }: CarriedEdit,
  choices: ReadonlyMap<string, SettlementSide>,
): Omit<DraftEdit, "body"> & { body: Record<string, unknown> | null } {
  if (onto === null) return edit;
  const body = edit.body === null ? null : mergedBody(recordOf(onto.body), merges, choices);
  return { ...edit, baseLetter: onto.letter, body };
}

/** A field of the settlement table with the three values printed. */
export function settlementRow(
  { edit, onto }: CarriedEdit,
  merge: FieldMerge,
  names: { base: NameBook; onto: NameBook },
): SettlementRow {
  const spec = specOf(edit, onto, merge.field);
  const print = (value: unknown, book: NameBook) => {
    if (value === undefined) return null;
    if (!spec) return typeof value === "string" ? value : JSON.stringify(value);
    const { text, unit } = fieldText(spec.type, value, book);
    return unit === undefined ? text : `${text} ${unit}`;
  };
  return {
    kind: edit.kind,
    number: edit.number,
    lineName: onto ? lineName(onto) : "",
    field: merge.field,
    label: spec?.label ?? merge.field,
    base: print(merge.base, names.base),
    theirs: print(merge.theirs, names.onto),
    yours: print(merge.yours, names.onto),
  };
}

export function settlementNames(base: BudgetState, onto: BudgetState, people: ReadonlyMap<number, string>) {
  return { base: nameBookOf(base, people), onto: nameBookOf(onto, people) };
}

function obstacleOf({ operation, kind, number }: DraftEdit, now: LineState): string | null {
  const line = `${LINE_KIND_NAMES[kind]} ${number}`;
  if (operation === "add") return `${line} exists already.`;
  if (operation === "reinstate") return now.retired ? null : `${line} was reinstated in issue ${now.issue}.`;
  return now.retired ? `${line} was retired in issue ${now.issue}: take this edit out, or reinstate the line.` : null;
}

function specOf(edit: DraftEdit, onto: LineState | null, path: string): FieldSpec | undefined {
  const bodies: (object | null)[] = [edit.body, onto?.body ?? null];
  for (const body of bodies) {
    const found = body && specAt(fieldsOfBody(edit.kind, body), path.split("."));
    if (found) return found;
  }
  return undefined;
}

function specAt(specs: readonly FieldSpec[], [key, ...rest]: readonly string[]): FieldSpec | undefined {
  const spec = specs.find((each) => each.key === key);
  if (!spec || rest.length === 0) return spec;
  const part = spec.type.type === "record" ? specAt(spec.type.of, rest) : undefined;
  return part && { ...part, label: `${spec.label}: ${part.label}` };
}

function find(state: BudgetState, kind: LineKind, number: string): LineState | undefined {
  return state.lines.find((line) => line.kind === kind && line.number === number);
}

function recordOf(body: object): Record<string, unknown> {
  return Object.fromEntries(Object.entries(body));
}

import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { canonicalLineText } from "@/lib/evaluation/lines/canonical-line-text";
import { fieldRows, type FieldRow } from "@/lib/evaluation/lines/field-rows";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { lineName, nameBookOf, type NameBook } from "@/lib/evaluation/lines/name-book";
import { LINE_KIND_NAMES, type EditOperation, type LineKind } from "@/lib/vocabulary/lines";

/** One printed field of a line on both sides of a change. */
export interface ChangedRow {
  field: string;
  label: string;
  was: string | null;
  toBe: string | null;
  unit: string | null;
  changed: boolean;
}

/** One line that gets a new revision, edited or by the way (the allocations sheet). */
export interface LineChange {
  kind: LineKind;
  number: string;
  name: string;
  operation: EditOperation;
  letterWas: string | null;
  letterNow: string;
  before: LineState | null;
  after: LineState;
  namesBefore: NameBook;
  namesAfter: NameBook;
}

/** The lines that a change revises, in the order of its edits, then what it brings along. */
export function lineChanges(
  edits: readonly LineEdit[],
  before: BudgetState,
  after: BudgetState,
  changedLines: readonly LineState[],
  people: ReadonlyMap<number, string>,
): LineChange[] {
  const namesBefore = nameBookOf(before, people);
  const namesAfter = nameBookOf(after, people);
  const place = (line: LineState) => {
    const index = edits.findIndex(({ kind, number }) => kind === line.kind && number === line.number);
    return index < 0 ? edits.length : index;
  };
  return [...changedLines]
    .sort((one, other) => place(one) - place(other))
    .map((line) => {
      const was = before.lines.find(({ kind, number }) => kind === line.kind && number === line.number) ?? null;
      const operation = edits[place(line)]?.operation ?? "revise";
      const letters = { letterWas: was?.letter ?? null, letterNow: line.letter };
      const { kind, number } = line;
      return {
        kind,
        number,
        name: lineName(line),
        operation,
        ...letters,
        before: was,
        after: line,
        namesBefore,
        namesAfter,
      };
    });
}

/** Every printed field, changed or not, in the order of the line's form. */
export function changedRows({ before, after, namesBefore, namesAfter }: LineChange): ChangedRow[] {
  const was = new Map(before === null ? [] : fieldRows(before, namesBefore).map((row) => [row.field, row]));
  const toBe = new Map(fieldRows(after, namesAfter).map((row) => [row.field, row]));
  return inOrder([...was.keys()], [...toBe.keys()]).flatMap((field) => {
    const [old, now] = [was.get(field), toBe.get(field)];
    const row = now ?? old;
    if (!row) return [];
    const texts = { was: textOf(old, row), toBe: textOf(now, row) };
    return [{ field, label: row.label, ...texts, unit: row.unit ?? null, changed: texts.was !== texts.toBe }];
  });
}

/** Rows of canonical text that differ: what a signature binds, in SI with every digit. */
export function canonicalRows(change: LineChange): { label: string; was: string | null; toBe: string | null }[] {
  const { before, after, namesBefore, namesAfter } = change;
  const was = rowMap(before === null ? "" : canonicalLineText(before, namesBefore));
  const toBe = rowMap(canonicalLineText(after, namesAfter));
  return inOrder([...was.keys()], [...toBe.keys()])
    .map((label) => ({ label, was: was.get(label) ?? null, toBe: toBe.get(label) ?? null }))
    .filter((row) => row.was !== row.toBe);
}

export function lineTitle({ kind, number, name }: Pick<LineChange, "kind" | "number" | "name">): string {
  return kind === "allocations" || kind === "terms"
    ? LINE_KIND_NAMES[kind].toLowerCase()
    : `${LINE_KIND_NAMES[kind].toLowerCase()} ${number} (${name})`;
}

/** The unit stands once in its column, unless the two sides are printed in different ones. */
function textOf(row: FieldRow | undefined, shown: FieldRow): string | null {
  if (row === undefined) return null;
  return row.unit === undefined || row.unit === shown.unit ? row.text : `${row.text} ${row.unit}`;
}

/** The new order, with what fell away after what it used to follow. */
function inOrder(was: readonly string[], toBe: readonly string[]): string[] {
  const order = [...toBe];
  was.forEach((key, index) => {
    if (order.includes(key)) return;
    const before = was.slice(0, index).findLast((candidate) => order.includes(candidate));
    order.splice(before === undefined ? 0 : order.indexOf(before) + 1, 0, key);
  });
  return order;
}

function rowMap(text: string): Map<string, string> {
  const rows = text === "" ? [] : text.split("\n");
  return new Map(rows.map((row) => [row.slice(0, row.indexOf(": ")), row.slice(row.indexOf(": ") + 2)]));
}

import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import type { DraftConflict } from "@/lib/proposals/drafting/merge-drafts";
import type { DraftContent, DraftEdit } from "@/lib/proposals/schema";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

const FACT_LABELS = new Map([
  ["title", "Title"],
  ["reason", "Reason"],
  ["neededBy", "Needed by"],
  ["transfers", "Transfers of allocation"],
]);

interface Sides {
  mine: DraftContent;
  theirs: DraftContent;
  people: readonly { id: number; name: string }[];
}

interface ConflictTexts {
  label: string;
  mine: string;
  theirs: string;
}

/** A conflict as the form would print it: the field's name, and both values in the units of the form. */
export function conflictTexts(conflict: DraftConflict, { mine, theirs, people }: Sides): ConflictTexts {
  const { line, field } = conflict;
  if (line === null) {
    const label = FACT_LABELS.get(conflict.key) ?? conflict.key;
    return { label, mine: plainText(conflict.mine), theirs: plainText(conflict.theirs) };
  }
  const editIn = ({ edits }: DraftContent) =>
    edits.find(({ kind, number }) => kind === line.kind && number === line.number) ?? null;
  const title = `${line.kind === "item" ? "" : `${LINE_KIND_NAMES[line.kind]} `}${line.number}`;
  if (field === null) {
    return { label: `${title}, the whole line`, mine: wholeText(editIn(mine)), theirs: wholeText(editIn(theirs)) };
  }
  const names = new Map(people.map(({ id, name }) => [id, name]));
  const [own, other] = [printed(editIn(mine), field, names), printed(editIn(theirs), field, names)];
  return { label: `${title} ${own.label ?? other.label ?? field}`, mine: own.text, theirs: other.text };
}

function printed(edit: DraftEdit | null, field: string, names: ReadonlyMap<number, string>) {
  const book = { person: (id: number) => names.get(id) ?? null, line: () => null };
  const rows = edit?.body ? fieldRows({ kind: edit.kind, body: edit.body }, book) : [];
  const own = rows.filter((row) => row.field === field || row.field.startsWith(`${field}.`));
  const [first] = own;
  if (!first) return { label: null, text: plainText(edit?.body?.[field.split(".")[0] ?? field]) };
  const texts = own.map(({ label, text, unit }) => {
    const value = unit === undefined ? text : `${text}\u2009${unit}`;
    return own.length === 1 ? value : `${label}: ${value}`;
  });
  return { label: first.label, text: texts.join("\n") };
}

function wholeText(edit: DraftEdit | null): string {
  return edit === null ? "taken out of the draft" : `kept, to be ${WORDS[edit.operation]}`;
}

const WORDS = { add: "added", revise: "revised", retire: "retired", reinstate: "reinstated" };

function plainText(value: unknown): string {
  if (value === null || value === undefined || value === "") return "empty";
  return typeof value === "string" ? value : JSON.stringify(value);
}

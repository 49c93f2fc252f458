import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { BudgetState, LineContent, LineState } from "../lines/line-state";
import { parseBody } from "../lines/parse-body";
import { lineNumber } from "../lines/text-schemas";
import type { LineEdit } from "./edits";
import { findLine } from "./indexed-state";
import { FIRST_LETTER, nextLetter } from "./next-letter";

export type ReadEdit = { ok: true; line: LineState } | { ok: false; faults: FieldFault[] };

/** One edit as the line it would leave behind, or what is wrong with it; paths begin at the edit. */
export function readEdit(edit: LineEdit, state: BudgetState, issue: number): ReadEdit {
  const forbidden = forbiddenSentence(edit);
  if (forbidden !== null) return refused("operation", forbidden);

  const current = findLine(state, edit.kind, edit.number);
  if (edit.operation === "add") return readAddition(edit, current, issue);
  if (!current) return refused("number", `There is no ${nameOf(edit)} ${edit.number}.`);
  if (edit.operation === "reinstate") {
    if (!current.retired) return refused("operation", `${edit.number} is in force already.`);
    const next = { number: edit.number, letter: nextLetter(current.letter), issue, retired: false };
    return edit.body === null ? { ok: true, line: { ...current, ...next } } : withBody(edit, next);
  }
  if (current.retired) return refused("operation", `${edit.number} is retired: reinstate it first.`);

  const next = { number: edit.number, letter: nextLetter(current.letter), issue, retired: edit.operation === "retire" };
  return edit.operation === "retire" ? { ok: true, line: { ...current, ...next } } : withBody(edit, next);
}

function forbiddenSentence({ kind, operation }: LineEdit): string | null {
  if (kind === "allocations") return "The allocations sheet changes by transfers alone: name giver and receiver.";
  if (kind === "terms" && operation !== "revise") return "A product has one terms line: it can only be revised.";
  return null;
}

function readAddition(edit: LineEdit, current: LineState | undefined, issue: number): ReadEdit {
  const number = lineNumber.safeParse(edit.number);
  if (!number.success) return refused("number", number.error.issues[0]?.message ?? "This is no number of a line.");
  if (current)
    return refused("number", `${edit.number} is taken: a number is never used again, not even a retired one.`);
  return withBody(edit, { number: edit.number, letter: FIRST_LETTER, issue, retired: false });
}

function withBody(edit: LineEdit, revision: Pick<LineState, "number" | "letter" | "issue" | "retired">): ReadEdit {
  if (edit.body === null) return refused("body", "Fill in the fields of this line.");
  const parsed = parseBody(edit.kind, edit.body);
  if (parsed.ok) return { ok: true, line: joined(revision, parsed.content) };
  const faults = parsed.faults.map(({ path, sentence }) => ({ path: path === "" ? "body" : `body.${path}`, sentence }));
  return { ok: false, faults };
}

function joined(revision: Pick<LineState, "number" | "letter" | "issue" | "retired">, content: LineContent): LineState {
  return { ...revision, ...content };
}

function refused(path: string, sentence: string): ReadEdit {
  return { ok: false, faults: [{ path, sentence }] };
}

function nameOf({ kind }: LineEdit): string {
  return LINE_KIND_NAMES[kind].toLowerCase();
}

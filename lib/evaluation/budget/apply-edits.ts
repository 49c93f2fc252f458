import type { FieldFault } from "@/lib/vocabulary/refusal";
import { ALLOCATIONS_NUMBER } from "../lines/allocations-body";
import type { BudgetState, LineState } from "../lines/line-state";
import { sameBody } from "../lines/same-body";
import type { AppliedChange, ApplyOptions, LineEdit, TransferEdit } from "./edits";
import { findLine } from "./indexed-state";
import { nextLetter } from "./next-letter";
import type { Problem } from "./problem";
import { readEdit } from "./read-edit";
import { sheetAfterChange } from "./sheet-after-change";
import { structureProblems } from "./structure-problems";

/**
 * The budget as a change would leave it, and everything that speaks against it. Edits with faults are left out, so that
 * the state can always be evaluated.
 */
export function applyEdits(
  state: BudgetState,
  edits: readonly LineEdit[],
  transfers: readonly TransferEdit[],
  options: ApplyOptions = {},
): AppliedChange {
  const issue = options.issue ?? Math.max(...state.lines.map((line) => line.issue)) + 1;
  const { accepted, faults } = readEdits(edits, state, issue);
  const settled = settle(state, accepted, options);
  const changed = settled.accepted.map(({ line }) => line).filter((line) => isChanged(line, state));
  const edited = replaceLines(state, changed);

  const { sheet, isMoved, ...allocations } = sheetAfterChange(state, edited, transfers);
  const current = findLine(state, "allocations", ALLOCATIONS_NUMBER);
  const sheetLine: LineState[] =
    isMoved && current?.kind === "allocations"
      ? [{ ...current, letter: nextLetter(current.letter), issue, body: sheet }]
      : [];
  return {
    state: replaceLines(edited, sheetLine),
    faults: [...faults, ...settled.faults, ...allocations.faults],
    shortfall: allocations.shortfall,
    changedLines: [...changed, ...sheetLine],
  };
}

interface AcceptedEdit {
  index: number;
  line: LineState;
}

function readEdits(edits: readonly LineEdit[], state: BudgetState, issue: number) {
  const accepted: AcceptedEdit[] = [];
  const faults: FieldFault[] = [];
  edits.forEach((edit, index) => {
    const isSecond = edits.findIndex(({ kind, number }) => kind === edit.kind && number === edit.number) < index;
    if (isSecond) {
      faults.push({ path: `edits.${index}.number`, sentence: `${edit.number} is edited twice here.` });
      return;
    }
    const read = readEdit(edit, state, issue);
    if (read.ok) accepted.push({ index, line: read.line });
    else faults.push(...read.faults.map(({ path, sentence }) => ({ path: `edits.${index}.${path}`, sentence })));
  });
  return { accepted, faults };
}

/** Takes out edits that the rest can't stand with, until what is left holds together. */
function settle(state: BudgetState, edits: readonly AcceptedEdit[], options: ApplyOptions) {
  let accepted = [...edits];
  const faults: FieldFault[] = [];
  for (;;) {
    const lines = accepted.map(({ line }) => line);
    const blamed = structureProblems(replaceLines(state, lines), options).flatMap((problem) =>
      blame(problem, accepted),
    );
    if (blamed.length === 0) return { accepted, faults };
    faults.push(...blamed.map(({ index, path, sentence }) => ({ path: `edits.${index}.${path}`, sentence })));
    const out = blamed.map(({ index }) => index);
    accepted = accepted.filter(({ index }) => !out.includes(index));
  }
}

function blame({ causes }: Problem, accepted: readonly AcceptedEdit[]) {
  for (const { kind, number, path, sentence } of causes) {
    const edit = accepted.find(({ line }) => line.kind === kind && line.number === number);
    if (edit) return [{ index: edit.index, path, sentence }];
  }
  return [];
}

/** A revision that says the same as the one before is none. */
function isChanged(line: LineState, state: BudgetState): boolean {
  const current = findLine(state, line.kind, line.number);
  return !current || current.retired !== line.retired || !sameBody(current.body, line.body);
}

/** Lines keep their places; new ones come last. */
function replaceLines(state: BudgetState, lines: readonly LineState[]): BudgetState {
  if (lines.length === 0) return state;
  const fresh = new Set(lines);
  const replaced = state.lines.map((line) => {
    const next = lines.find(({ number, kind }) => number === line.number && kind === line.kind);
    if (next) fresh.delete(next);
    return next ?? line;
  });
  return { ...state, lines: [...replaced, ...fresh] };
}

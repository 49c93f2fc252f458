import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { needsJustification, noteExcess, noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import type { NoteCode } from "@/lib/evaluation/notes/note-code";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";
import type { FieldFault } from "@/lib/vocabulary/refusal";

/** A note of an edited item that may only stand with a reason. */
export interface JustificationNeed {
  /** Index of the edit. */
  edit: number;
  item: string;
  code: NoteCode;
  /** The worst over all operating points. */
  excess: number;
  sentence: string;
  /** Whether the body carries a justification that covers this excess. */
  isMet: boolean;
}

/** Rounding of results to 12 digits must not ask for a justification again. */
const EXCESS_TOLERANCE = 1e-9;

/** Every note of an edited item that needs a justification, whether it has one or not. */
export function justificationNeeds(
  edits: readonly LineEdit[],
  after: BudgetState,
  results: BudgetResults,
): JustificationNeed[] {
  return edits.flatMap((edit, index) => {
    const body = editedItem(edit, after);
    if (body === null) return [];
    return worstNotes(edit.number, results).map(({ code, excess, sentence }) => {
      const given = body.justifications.find((justification) => justification.code === code);
      const isMet = given !== undefined && given.excess >= excess - Math.abs(excess) * EXCESS_TOLERANCE;
      return { edit: index, item: edit.number, code, excess, sentence, isMet };
    });
  });
}

/**
 * The justifications of an edit, each with how far its note goes now; the base revision's own keep what they covered
 * there. null where the edit carries none.
 */
export function stampedJustifications(
  edit: LineEdit,
  base: BudgetState,
  results: BudgetResults,
): ItemBody["justifications"] | null {
  const parsed = edit.kind === "item" ? parseBody("item", edit.body) : null;
  if (!parsed?.ok || parsed.content.kind !== "item" || parsed.content.body.justifications.length === 0) return null;
  const line = base.lines.find(({ kind, number }) => kind === "item" && number === edit.number);
  const earlier = line?.kind === "item" ? line.body.justifications : [];
  const worst = worstNotes(edit.number, results);
  return parsed.content.body.justifications.map((given) => {
    const isOld = earlier.some(
      ({ code, text, excess }) => code === given.code && text === given.text && excess === given.excess,
    );
    const excess = worst.find(({ code }) => code === given.code)?.excess;
    return isOld || excess === undefined ? given : { ...given, excess };
  });
}

export function justificationFaults(needs: readonly JustificationNeed[]): FieldFault[] {
  return needs
    .filter(({ isMet }) => !isMet)
    .map(({ edit, sentence }) => ({
      path: `edits.${edit}.body.justifications`,
      sentence: `Say why this may stand: ${sentence}`,
    }));
}

/** A grade above estimated rests on a document that is cited. */
export function evidenceFaults(edits: readonly LineEdit[], after: BudgetState): FieldFault[] {
  return edits.flatMap((edit, index) => {
    const body = editedItem(edit, after);
    if (body === null || body.grade === "estimated" || body.evidence.length > 0) return [];
    const grade = MATURITY_GRADE_NAMES[body.grade];
    const sentence = `The grade ${grade} needs evidence: cite a document with its revision and date.`;
    return [{ path: `edits.${index}.body.evidence`, sentence }];
  });
}

/** Results that are refused at any operating point: none may be proposed, edited or following. */
export function refusedResultFaults(edits: readonly LineEdit[], results: BudgetResults): FieldFault[] {
  return results.points.flatMap(({ operatingPoint, items }) =>
    items.flatMap(({ item, refused }) => {
      if (refused === null) return [];
      const index = edits.findIndex(({ kind, number }) => kind === "item" && number === item);
      const path = index < 0 ? "edits" : `edits.${index}.body`;
      return [{ path, sentence: `Item ${item} has no result at ${operatingPoint}. ${noteSentence(refused)}` }];
    }),
  );
}

/** The item as the edit leaves it; a retired one needs nothing any more. */
function editedItem({ kind, operation, number }: LineEdit, after: BudgetState): ItemBody | null {
  if (kind !== "item" || operation === "retire") return null;
  const line = after.lines.find((candidate) => candidate.kind === "item" && candidate.number === number);
  return line?.kind === "item" ? line.body : null;
}

function worstNotes(item: string, results: BudgetResults): { code: NoteCode; excess: number; sentence: string }[] {
  const worst = new Map<NoteCode, { code: NoteCode; excess: number; sentence: string }>();
  for (const point of results.points) {
    const notes = point.items.find((result) => result.item === item)?.notes.filter(needsJustification) ?? [];
    for (const note of notes) {
      const excess = noteExcess(note);
      const known = worst.get(note.code);
      if (known === undefined || excess > known.excess) {
        worst.set(note.code, { code: note.code, excess, sentence: noteSentence(note) });
      }
    }
  }
  return [...worst.values()];
}

import { NoteMark } from "@/app/_components/note-mark";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import type { Note } from "@/lib/evaluation/notes/note";

/** Cautions and refusals stand in the row by what they say first; the whole sentence opens with the number, and is printed. */
export function RowNotes({ notes }: { notes: readonly Note[] }) {
  const grave = notes.filter(isGrave);
  const informing = notes.length - grave.length;

  return (
    <>
      {grave.map((note) => (
        <NoteMark key={note.code} severity={note.severity}>
          <span title={noteSentence(note)} className="print:hidden">
            {firstClause(noteSentence(note))}
          </span>
          <span className="hidden print:inline">{noteSentence(note)}</span>
        </NoteMark>
      ))}
      {informing > 0 ? (
        <span className="block text-xs text-ink-2">
          <span aria-hidden>○ </span>
          {informing} {informing === 1 ? "note" : "notes"} for information
        </span>
      ) : null}
    </>
  );
}

/** On a narrow screen, where there is no room for sentences: "▲ 2". */
export function NoteCount({ notes }: { notes: readonly Note[] }) {
  const grave = notes.filter(isGrave).length;
  if (grave === 0) return null;

  return (
    <span className="text-xs text-ink-2">
      <span aria-hidden>▲ </span>
      {grave} {grave === 1 ? "caution" : "cautions"}
    </span>
  );
}

function isGrave({ severity }: Note): boolean {
  return severity !== "information";
}

/** A note says what, why and what to do; the first of the three ends at the first stop. */
function firstClause(sentence: string): string {
  return sentence.split(/[:;.]\s/)[0] ?? sentence;
}

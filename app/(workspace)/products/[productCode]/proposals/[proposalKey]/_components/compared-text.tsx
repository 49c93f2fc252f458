import type { TextRow } from "@/lib/budget/text-diff";
import type { ComparedText } from "@/lib/proposals/sheet-views";

const MARKS: Record<TextRow["side"], { mark: string; word: string; look: string }> = {
  both: { mark: "\u00a0", word: "", look: "text-ink-2" },
  was: { mark: "−", word: "was: ", look: "line-through decoration-ink-2" },
  toBe: { mark: "+", word: "to be: ", look: "font-semibold" },
};

interface ComparedLinesProps {
  compared: ComparedText;
  /** "Line by line with round 1" */
  title: string;
  open?: boolean;
}

/** A long text beside what it said before, line by line; both whole where comparing was given up. */
export function ComparedLines({ compared: { was, toBe, rows }, title, open = false }: ComparedLinesProps) {
  return (
    <details open={open} className="mt-2 border-y border-rule py-1 font-normal">
      <summary className="min-h-6 text-sm">{title}</summary>
      {rows === null ? (
        <p className="mt-1 text-sm text-ink-2">
          The two texts differ too much to be compared in time, so both stand here whole.
        </p>
      ) : null}
      <ul className="my-1 max-h-96 overflow-auto text-sm print:max-h-none" tabIndex={0} aria-label={title}>
        {(rows ?? bothWhole(was, toBe)).map(({ side, text }, at) => (
          <li key={at} className="grid grid-cols-[1rem_minmax(0,1fr)]">
            <span aria-hidden>{MARKS[side].mark}</span>
            <span className={`break-words whitespace-pre-wrap ${MARKS[side].look}`}>
              <span className="sr-only">{MARKS[side].word}</span>
              {text === "" ? "\u00a0" : text}
            </span>
          </li>
        ))}
      </ul>
    </details>
  );
}

function bothWhole(was: string, toBe: string): TextRow[] {
  return [
    { side: "was", text: was },
    { side: "toBe", text: toBe },
  ];
}

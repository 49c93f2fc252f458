import { Children, type ReactNode } from "react";

import { SymbolText } from "./symbol-text";

export type NoteSeverity = "information" | "caution" | "refusal";

const MARKS: Record<NoteSeverity, string> = { information: "○", caution: "▲", refusal: "✕" };

interface NoteMarkProps {
  severity: NoteSeverity;
  /** The note's sentence, or a short form of it. */
  children: ReactNode;
  /** The note's code, where its reader needs it. */
  code?: string;
}

/** A note of a result: its sign, its severity in words for those who hear it, its sentence. */
export function NoteMark({ severity, children, code }: NoteMarkProps) {
  return (
    <span className={`block text-sm ${severity === "refusal" ? "text-signal" : "text-ink-2"}`}>
      <span aria-hidden className="mr-1 text-2xs">
        {MARKS[severity]}
      </span>
      <span className="sr-only">{severity}: </span>
      {Children.map(children, (part) => (typeof part === "string" ? <SymbolText symbol={part} /> : part))}
      {code ? <span className="ml-1.5 font-code text-xs">{code}</span> : null}
    </span>
  );
}

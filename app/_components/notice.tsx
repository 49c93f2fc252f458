import type { ReactNode } from "react";

export type NoticeKind = "plain" | "done" | "caution" | "refusal";

const LOOKS: Record<NoticeKind, { frame: string; mark: string; word: string }> = {
  plain: { frame: "border-ink", mark: "", word: "" },
  done: { frame: "border-spruce", mark: "✓", word: "Done: " },
  caution: { frame: "border-ochre bg-ochre-pale", mark: "▲", word: "Caution: " },
  refusal: { frame: "border-signal bg-signal-pale", mark: "✕", word: "Refused: " },
};

interface NoticeProps {
  kind?: NoticeKind;
  children: ReactNode;
}

/** A sentence about the page or the form as a whole. Refusals are announced at once, the rest when there is time. */
export function Notice({ kind = "plain", children }: NoticeProps) {
  const { frame, mark, word } = LOOKS[kind];

  return (
    <div role={kind === "refusal" ? "alert" : "status"} className={`border-l-4 px-3 py-2 ${frame}`}>
      {mark ? (
        <span aria-hidden className="mr-1.5 text-xs">
          {mark}
        </span>
      ) : null}
      {word ? <span className="sr-only">{word}</span> : null}
      {children}
    </div>
  );
}

import type { ReactNode } from "react";

interface EmptyNoteProps {
  /** What is not there: "No proposals yet." */
  title: string;
  /** What to do first. */
  children?: ReactNode;
}

/** An empty page says what to do first. */
export function EmptyNote({ title, children }: EmptyNoteProps) {
  return (
    <div className="border-y border-rule py-4">
      <p className="font-semibold">{title}</p>
      {children ? <div className="mt-1 max-w-[60ch] text-ink-2">{children}</div> : null}
    </div>
  );
}

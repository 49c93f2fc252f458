import type { ReactNode } from "react";

interface FigureWithTableProps {
  /** What the picture says, in a sentence. */
  summary: string;
  /** The picture; it is hidden from those who hear the page, they get summary and table. */
  picture: ReactNode;
  /** The same numbers as a `Table`. */
  table: ReactNode;
  caption?: ReactNode;
}

/** A picture with the table behind it. */
export function FigureWithTable({ summary, picture, table, caption }: FigureWithTableProps) {
  return (
    <figure className="my-4">
      <div role="img" aria-label={summary}>
        {picture}
      </div>
      <figcaption className="mt-1 text-sm text-ink-2">
        {caption}
        <details className="mt-1 text-ink print:hidden">
          <summary className="link w-fit text-sm">As a table</summary>
          <div className="mt-2">{table}</div>
        </details>
      </figcaption>
    </figure>
  );
}

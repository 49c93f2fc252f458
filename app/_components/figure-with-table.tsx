import type { ReactNode } from "react";

import { SaveFigure } from "./save-figure/save-figure";

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
        <div className="mt-1 flex flex-wrap items-baseline gap-x-4 text-ink">
          <details className="open:basis-full print:hidden">
            <summary className="link w-fit text-sm">As a table</summary>
            <div className="mt-2">{table}</div>
          </details>
          <SaveFigure />
        </div>
      </figcaption>
    </figure>
  );
}

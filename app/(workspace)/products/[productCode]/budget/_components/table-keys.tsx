import { Notice } from "@/app/_components/notice";

interface TableKeysProps {
  isLong: boolean;
  /** Whether every row is there. */
  isRead: boolean;
  problem: string | null;
}

/** What the keyboard does in the table; and of a long one, that it is longer than what stands in the document. */
export function TableKeys({ isLong, isRead, problem }: TableKeysProps) {
  return (
    <div className="mt-2 text-sm text-ink-2 print:hidden">
      {isLong && !isRead && problem === null ? <p role="status">Reading the other rows…</p> : null}
      {problem === null ? null : <Notice kind="refusal">{problem}</Notice>}
      {isLong ? (
        <noscript>
          <p>Without scripts only the first rows stand here. Find an item above, or take the sheet as a file.</p>
        </noscript>
      ) : null}
      <details>
        <summary className="link w-fit">Keys</summary>
        <p className="mt-1 max-w-prose">
          With the focus on a name or a number of a row: <kbd>↑</kbd> and <kbd>↓</kbd> go to the same column of the row
          above or below, <kbd>Ctrl</kbd> <kbd>Home</kbd> and <kbd>Ctrl</kbd> <kbd>End</kbd> to the first and the last
          row, <kbd>Enter</kbd> opens a number’s working or an item’s page and folds a group. Elsewhere the keys do what
          they do on every page.
          {isLong
            ? " Only the rows in view stand in the document: look for an item with “Find an item”, which knows all."
            : ""}
        </p>
      </details>
    </div>
  );
}

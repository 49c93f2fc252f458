"use client";

import { type ReactNode, useId, useState } from "react";

interface FieldsThatStayProps {
  count: number;
  /** Of the line: read out with the button. */
  of: string;
  columns: number;
  /** Their rows. */
  children: ReactNode;
}

/** What a line keeps, behind one row, so that what changes is found at once; a print has all of it. */
export function FieldsThatStay({ count, of, columns, children }: FieldsThatStayProps) {
  const [open, setOpen] = useState(false);
  const id = useId();

  return (
    <>
      <tbody className="print:hidden">
        <tr className="bg-sheet">
          <td colSpan={columns} className="border-b border-rule px-2.5 py-2 max-sm:block!">
            <button
              type="button"
              className="link text-sm"
              aria-expanded={open}
              aria-controls={id}
              onClick={() => setOpen(!open)}
            >
              {open ? "Hide" : "Show"} {count === 1 ? "the field that stays" : `the ${count} fields that stay`}
              <span className="sr-only"> of {of}</span>
            </button>
          </td>
        </tr>
      </tbody>
      <tbody id={id} className={open ? undefined : "hidden! print:table-row-group!"}>
        {children}
      </tbody>
    </>
  );
}

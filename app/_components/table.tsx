import Link from "next/link";
import type { Route } from "next";
import type { ComponentProps, ReactNode } from "react";

interface TableProps {
  /** Names the table; read out, and shown above it when `showCaption` is set. */
  caption: string;
  showCaption?: boolean;
  /**
   * On a narrow screen: "scroll" keeps columns and scrolls inside the sheet with the first one held,
   * "stack" turns each row into a block whose cells carry their `label`.
   */
  narrow?: "scroll" | "stack";
  /** Rows of the body, where not all of them stand in the document. */
  rowCount?: number;
  children: ReactNode;
}

const SCROLL =
  "max-lg:min-w-[42rem] max-lg:[&_tr>*:first-child]:sticky max-lg:[&_tr>*:first-child]:left-0 max-lg:[&_tr>*:first-child]:z-10 max-lg:[&_tr>*:first-child]:max-w-[42vw] max-lg:[&_tr>*:first-child]:bg-inherit max-lg:[&_tr>*:first-child]:whitespace-normal";

const STACK =
  "max-sm:block max-sm:[&_caption]:block max-sm:[&_thead]:sr-only max-sm:[&_tbody]:block max-sm:[&_tbody_tr]:block max-sm:[&_tbody_tr]:border-b max-sm:[&_tbody_tr]:border-rule-strong max-sm:[&_tbody_tr]:py-2 max-sm:[&_tbody_tr>*]:grid max-sm:[&_tbody_tr>*:has(>div:only-child:empty)]:hidden max-sm:[&_tbody_tr>*]:grid-cols-[8rem_minmax(0,1fr)] max-sm:[&_tbody_tr>*]:gap-x-3 max-sm:[&_tbody_tr>*]:border-0 max-sm:[&_tbody_tr>*]:px-0 max-sm:[&_tbody_tr>*]:py-1 max-sm:[&_tbody_tr>*]:text-left max-sm:[&_tbody_tr>*]:whitespace-normal max-sm:[&_tbody_tr>*]:before:text-xs max-sm:[&_tbody_tr>*]:before:font-normal max-sm:[&_tbody_tr>*]:before:text-ink-2 max-sm:[&_tbody_tr>*]:before:content-[attr(data-label)]";

/** A table of a sheet. Its header stays in sight while a long one is read. */
export function Table({ caption, showCaption = false, narrow = "scroll", rowCount, children }: TableProps) {
  const table = (
    <table
      aria-rowcount={rowCount === undefined ? undefined : rowCount + 1}
      className={`w-full border-collapse text-table ${narrow === "stack" ? STACK : SCROLL}`}
    >
      <caption className={showCaption ? "pb-1 text-left text-sm text-ink-2" : "sr-only"}>{caption}</caption>
      {children}
    </table>
  );

  if (narrow === "stack") return table;

  return (
    <div role="region" aria-label={caption} tabIndex={0} className="relative overflow-x-auto lg:overflow-visible">
      {table}
    </div>
  );
}

/** The head of a table: one row of `Head` cells. */
export function TableHead({ children }: { children: ReactNode }) {
  return (
    <thead className="bg-sheet lg:sticky lg:top-0 lg:z-20 print:static">
      <tr className="bg-sheet">{children}</tr>
    </thead>
  );
}

interface HeadProps extends ComponentProps<"th"> {
  numeric?: boolean;
  /** The unit, in a line of its own. */
  unit?: string;
  /** Makes the heading a link that sorts. */
  sortHref?: string;
  sorted?: "ascending" | "descending";
}

/** Heading of a column. Numbers stand at the right, and so does their heading. */
export function Head({ numeric = false, unit, sortHref, sorted, className, children, ...rest }: HeadProps) {
  const text = (
    <>
      {children}
      {unit ? <span className="block font-normal">{unit}</span> : null}
      {sorted ? <span aria-hidden>{sorted === "ascending" ? " ↑" : " ↓"}</span> : null}
    </>
  );

  return (
    <th
      scope="col"
      aria-sort={sorted}
      className={join(
        "border-b border-ink px-2.5 py-1.5 align-bottom text-xs font-medium text-ink-2",
        numeric ? "text-right" : "text-left",
        className,
      )}
      {...rest}
    >
      {sortHref ? (
        <Link href={sortHref as Route} className="hover:text-ink hover:underline" scroll={false}>
          {text}
        </Link>
      ) : (
        text
      )}
    </th>
  );
}

interface RowProps extends ComponentProps<"tr"> {
  /** A row that sums up those below or above it. */
  band?: boolean;
}

export function Row({ band = false, className, ...rest }: RowProps) {
  return <tr className={join(band ? "bg-band font-semibold" : "bg-sheet", className)} {...rest} />;
}

interface CellProps extends ComponentProps<"td"> {
  numeric?: boolean;
  /** Name of the column, shown beside the value where rows are stacked. */
  label?: string;
}

export function Cell({ numeric = false, label, className, children, ...rest }: CellProps) {
  return (
    <td
      data-label={label}
      className={join(
        "border-b border-rule px-2.5 py-2 align-top",
        numeric ? "text-right whitespace-nowrap" : "text-left",
        className,
      )}
      {...rest}
    >
      {label ? <div className="min-w-0">{children}</div> : children}
    </td>
  );
}

/** The cell that names its row. */
export function RowHead({ label, className, children, ...rest }: ComponentProps<"th"> & { label?: string }) {
  return (
    <th
      scope="row"
      data-label={label}
      className={join("border-b border-rule px-2.5 py-2 text-left align-top font-normal", className)}
      {...rest}
    >
      {label ? <div className="min-w-0">{children}</div> : children}
    </th>
  );
}

function join(...names: (string | undefined)[]): string {
  return names.filter(Boolean).join(" ");
}

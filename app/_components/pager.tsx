import type { Route } from "next";
import Link from "next/link";

interface PagerProps {
  /** From 1. */
  page: number;
  pages: number;
  hrefOf: (page: number) => string;
}

/** Earlier and later pages of a long list, as links. */
export function Pager({ page, pages, hrefOf }: PagerProps) {
  if (pages <= 1) return null;

  return (
    <nav aria-label="Pages" className="mt-4 flex items-baseline gap-4 text-sm print:hidden">
      {page > 1 ? (
        <Link className="link" href={hrefOf(page - 1) as Route} rel="prev">
          Previous
        </Link>
      ) : null}
      <span className="text-ink-2">
        Page {page} of {pages}
      </span>
      {page < pages ? (
        <Link className="link" href={hrefOf(page + 1) as Route} rel="next">
          Next
        </Link>
      ) : null}
    </nav>
  );
}

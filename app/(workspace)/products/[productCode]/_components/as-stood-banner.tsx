import type { Route } from "next";
import Link from "next/link";

import { Notice } from "@/app/_components/notice";
import { utcMinuteText } from "@/app/_components/utc-text";
import type { BudgetAt } from "@/lib/budget/views";

/** Says plainly that an earlier issue is shown, and leads to the newest. */
export function AsStoodBanner({
  budget,
  newestHref,
}: {
  budget: Pick<BudgetAt, "product" | "issue">;
  newestHref: string;
}) {
  const { issue, product } = budget;
  if (product.newestIssue === null || issue.number === product.newestIssue) return null;

  return (
    <div className="mb-4">
      <Notice>
        As it stood at issue {issue.number}, issued {utcMinuteText(issue.at)}. The newest is issue {product.newestIssue}
        .{" "}
        <Link className="link print:hidden" href={newestHref as Route}>
          Show the newest
        </Link>
      </Notice>
    </div>
  );
}

import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";

import { EmptyNote } from "@/app/_components/empty-note";

import type { BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import type { SheetUncertainty } from "@/app/(workspace)/products/[productCode]/_uncertainty/frozen-uncertainty";

interface NoUncertaintyProps {
  why: Exclude<SheetUncertainty, { state: "known" }>;
  sheet: BudgetSheet;
}

/** Why the sheet has no interval, and what to do first. */
export function NoUncertainty({ why, sheet: { budget, point } }: NoUncertaintyProps) {
  const base = `/products/${budget.product.code}`;

  switch (why.state) {
    case "not_kept":
      return (
        <EmptyNote title={`Issue ${budget.issue.number} keeps no uncertainty.`}>
          <p>It was issued before uncertainties were frozen with each issue. The next one will have it.</p>
        </EmptyNote>
      );
    case "no_items":
      return (
        <EmptyNote title="There is no item yet, so there is no sum to be uncertain about.">
          <p>
            Items come by <BaseLink href={`${base}/proposals`}>proposals</BaseLink>. Most methods bring an uncertainty
            of their own; a standard uncertainty of each input comes on top of it.
          </p>
        </EmptyNote>
      );
    case "exact":
      return (
        <EmptyNote title={`Nothing at ${point.operatingPoint} carries a standard uncertainty.`}>
          <p>
            Every item is a force that is given without one, so ΣB is shown as if it were exact. State a standard
            uncertainty of the forces, or choose methods that bring their own, by a{" "}
            <BaseLink href={`${base}/proposals`}>proposal</BaseLink>.
          </p>
        </EmptyNote>
      );
    case "refused":
      return (
        <EmptyNote title={`At ${point.operatingPoint} there is no sum to be uncertain about.`}>
          <p>
            Refused, and so without a result:{" "}
            {why.items.map((item, at) => (
              <span key={item}>
                {at === 0 ? "" : ", "}
                <BaseLink href={`${base}/items/${encodeURIComponent(item)}`}>item {item}</BaseLink>
              </span>
            ))}
            . The note on each says what to change.
          </p>
        </EmptyNote>
      );
  }
}

function BaseLink({ href, children }: { href: string; children: ReactNode }) {
  return (
    <Link className="link" href={href as Route}>
      {children}
    </Link>
  );
}

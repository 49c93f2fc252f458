import { dayText } from "@/app/_components/utc-text";
import type { TitleBlockField } from "@/app/_components/title-block";
import type { BudgetAt, IssueFacts } from "@/lib/budget/views";
import type { PointTotals } from "@/lib/evaluation/budget/results";

/** The title block of a sheet that shows a budget at an issue. */
export function budgetFields(
  { product, issue }: Pick<BudgetAt, "product" | "issue">,
  point: Pick<PointTotals, "operatingPoint" | "name"> | null,
): TitleBlockField[] {
  return [
    { label: "Product", value: `${product.code} ${product.name}` },
    { label: "Issue", value: String(issue.number) },
    { label: "Date", value: dayText(issue.at) },
    ...(point ? [{ label: "Operating point", value: `${point.operatingPoint} ${point.name}` }] : []),
    { label: "Proposed", value: proposedBy(issue) },
    { label: "Approved", value: approvedBy(issue) },
  ];
}

/** Who proposed what made the issue; the first one is established by the signature of one person. */
export function proposedBy({ proposal }: IssueFacts): string {
  return proposal ? proposal.proposer.name : "established";
}

export function approvedBy({ signatures }: IssueFacts): string {
  if (signatures.length === 0) return "–";
  return signatures
    .map(({ printedName, deputyFor }) => (deputyFor === null ? printedName : `${printedName} for ${deputyFor}`))
    .join(", ");
}

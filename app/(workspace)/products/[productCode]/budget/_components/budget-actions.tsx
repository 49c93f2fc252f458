import { ButtonLink } from "@/app/_components/button";
import { ExportMenu } from "@/app/_components/export-menu";

interface BudgetActionsProps {
  productCode: string;
  issue: number;
  operatingPoint: string;
  mayStart: boolean;
}

/** What one may do from the budget sheet; an auditor takes it along, and changes nothing. */
export function BudgetActions({ productCode, issue, operatingPoint, mayStart }: BudgetActionsProps) {
  const file = (format: string) =>
    `/api/products/${productCode}/sheet?${new URLSearchParams({ format, issue: String(issue), point: operatingPoint })}`;

  return (
    <div className="flex flex-wrap gap-2">
      <ExportMenu
        entries={[
          { label: "Sheet as CSV", href: file("csv") },
          { label: "Sheet as XLSX", href: file("xlsx") },
        ]}
      />
      <ButtonLink href={`/products/${productCode}/report`}>Report</ButtonLink>
      {mayStart ? <ButtonLink href={`/products/${productCode}/proposals`}>Propose a change…</ButtonLink> : null}
    </div>
  );
}

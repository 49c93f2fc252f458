import type { ChosenMeasure } from "@/app/(workspace)/_measures/chosen-measure";
import { ButtonLink } from "@/app/_components/button";
import { ExportMenu } from "@/app/_components/export-menu";

interface BudgetActionsProps {
  productCode: string;
  issue: number;
  operatingPoint: string;
  /** In which the sheet is read: a file has it beside the newtons. */
  measure: Pick<ChosenMeasure, "measure" | "units">;
  mayStart: boolean;
}

/** What one may do from the budget sheet; an auditor takes it along, and changes nothing. */
export function BudgetActions({
  productCode,
  issue,
  operatingPoint,
  measure: { measure, units },
  mayStart,
}: BudgetActionsProps) {
  const read = { ...(measure === "newtons" ? {} : { measure }), ...(units === "si" ? {} : { units }) };
  const file = (format: string) =>
    `/api/products/${productCode}/sheet?${new URLSearchParams({ format, issue: String(issue), point: operatingPoint, ...read })}`;

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

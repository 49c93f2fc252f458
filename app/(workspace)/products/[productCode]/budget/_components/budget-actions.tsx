import { ButtonLink } from "@/app/_components/button";

interface BudgetActionsProps {
  productCode: string;
  mayStart: boolean;
}

/** What one may do from the budget sheet; an auditor reads only. */
export function BudgetActions({ productCode, mayStart }: BudgetActionsProps) {
  if (!mayStart) return null;
  return <ButtonLink href={`/products/${productCode}/proposals`}>Propose a change…</ButtonLink>;
}

import { AlternateLines } from "@/app/(workspace)/_friction-pictures/alternate-lines";
import { SectionHeading } from "@/app/_components/section-heading";
import type { BudgetAt } from "@/lib/budget/views";
import { methodInputOf } from "@/lib/evaluation/budget/method-input";
import { alternateLines } from "@/lib/evaluation/methods/alternate-lines";
import { formatPercent } from "@/lib/units/format-number";

import { WorkingView } from "@/app/(workspace)/products/[productCode]/_components/working-view";
import {
  type BudgetSheet,
  budgetSheet,
  type ItemRow,
  pointOf,
} from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { basicWorking } from "@/app/(workspace)/products/[productCode]/_workings/item-working";

interface WorkedStepsProps {
  /** Today's budget with the change. */
  budget: BudgetAt;
  /** Numbers of the edited items. */
  items: readonly string[];
}

/** How each edited item's figure comes about, for who signs it, and what other friction lines would say. */
export function WorkedSteps({ budget, items }: WorkedStepsProps) {
  const point = pointOf(budget, undefined);
  if (!point) return null;
  const sheet = budgetSheet(budget, point);
  const rows = sheet.rows.flatMap((row) => (row.kind === "item" && items.includes(row.number) ? [row] : []));
  if (rows.length === 0) return null;

  return (
    <section className="mt-7">
      <SectionHeading>Worked steps, on issue {budget.issue.number} with this change</SectionHeading>
      {rows.map((row) => (
        <details key={row.number} className="border-b border-rule py-2 first-of-type:border-t">
          <summary className="min-h-6">
            {row.number} {row.name} at {point.operatingPoint}
          </summary>
          <div className="mt-3 mb-2">
            <WorkingView working={basicWorking(sheet, row)} base={`/products/${budget.product.code}`} />
            <OtherLines sheet={sheet} row={row} />
          </div>
        </details>
      ))}
    </section>
  );
}

function OtherLines({ sheet, row: { body, number } }: { sheet: BudgetSheet; row: ItemRow }) {
  if (body.method === "share") return null;
  const alternates = alternateLines(body.methodVersion, methodInputOf(body, sheet.indexed), sheet.point.stream);
  if (!alternates) return null;

  return (
    <div className="mt-4">
      <p className="mb-1 text-sm">
        By other friction lines: a spread of {formatPercent(alternates.spread, 1)} of this item&apos;s drag.
      </p>
      <AlternateLines
        lines={alternates.lines}
        caption={`Item ${number} by every friction line whose range holds its Reynolds number`}
      />
    </div>
  );
}

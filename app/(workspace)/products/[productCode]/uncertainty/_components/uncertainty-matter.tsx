import { SectionHeading } from "@/app/_components/section-heading";
import type { RunView } from "@/lib/budget/monte-carlo/runs-of";

import type { BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { causeRows } from "@/app/(workspace)/products/[productCode]/_uncertainty/cause-rows";
import { sheetUncertainty } from "@/app/(workspace)/products/[productCode]/_uncertainty/frozen-uncertainty";
import { CausesTable } from "./causes-table";
import { IntervalFigure } from "./interval-figure";
import { ItemsTable } from "./items-table";
import { NoUncertainty } from "./no-uncertainty";
import { RunForm } from "./run-form";
import { RunsTable } from "./runs-table";
import { UncertaintyHead } from "./uncertainty-head";

interface UncertaintyMatterProps {
  sheet: BudgetSheet;
  runs: readonly RunView[];
  mayRun: boolean;
}

export function UncertaintyMatter({ sheet, runs, mayRun }: UncertaintyMatterProps) {
  const uncertainty = sheetUncertainty(sheet);
  if (uncertainty.state !== "known") return <NoUncertainty why={uncertainty} sheet={sheet} />;
  const { frozen } = uncertainty;
  const { budget, point } = sheet;

  return (
    <>
      <UncertaintyHead frozen={frozen} />
      <IntervalFigure point={point} frozen={frozen} newestRun={runs.at(-1) ?? null} />
      <SectionHeading aside="of the variance of ΣB, to first order">Causes</SectionHeading>
      <CausesTable rows={causeRows(sheet, frozen)} others={frozen.otherCauses} />
      <SectionHeading aside="under each figure: its difference from first order">
        First order and Monte Carlo
      </SectionHeading>
      <RunsTable frozen={frozen} runs={runs} issue={budget.issue.number} productCode={budget.product.code} />
      <RunForm
        key={`${budget.issue.number} ${point.operatingPoint} ${runs.length}`}
        productCode={budget.product.code}
        issue={budget.issue.number}
        operatingPoint={point.operatingPoint}
        nextSeed={1 + Math.max(0, ...runs.map(({ seed }) => seed))}
        mayRun={mayRun}
      />
      <SectionHeading aside="items share causes: these do not add up to the total’s">Items</SectionHeading>
      <ItemsTable sheet={sheet} />
    </>
  );
}

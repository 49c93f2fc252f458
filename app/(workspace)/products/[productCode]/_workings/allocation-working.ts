import type { LineRevisionView } from "@/lib/budget/views";
import { formatHundredths, formatNewtonsNumber } from "@/lib/units/format-newtons";

import type { BudgetRow, BudgetSheet } from "../_sheet/budget-sheet";
import { step } from "./item-working";
import { emptyWorking } from "./total-working";
import type { Working } from "./working";

/** What a line was given, and which act last moved it; revisions come newest first. */
export function allocationWorking(row: BudgetRow, sheetRevisions: readonly LineRevisionView[]): Working {
  const last = sheetRevisions.find(({ fields }) =>
    fields.some(({ field }) => field === `rows.${row.kind}-${row.number}`),
  );
  const change = last?.fields.find(({ field }) => field === `rows.${row.kind}-${row.number}`);
  const base = emptyWorking(`Allocation of ${row.number} ${row.name}`);
  if (row.allocationHundredths === null) {
    return {
      ...base,
      sentences: ["The allocations sheet has no row for it: nothing was given yet, so it cannot be over."],
    };
  }

  return {
    ...base,
    answer: `${formatHundredths(row.allocationHundredths)} N`,
    sentences: [
      ...(last && change ? [movedSentence(last, change.was, change.now)] : []),
      ...(row.kind === "group" ? ["A group's allocation is a ceiling: its members may not hold more together."] : []),
      "It changes only by transfers and by acts that free allocation.",
    ],
    links: last?.issue.proposal
      ? [
          {
            path: `proposals/${last.issue.proposal.number}`,
            label: `${last.issue.proposal.label} ${last.issue.proposal.title}`,
          },
        ]
      : [],
  };
}

/** What is left of the allocation: the item's own margin, apart from the total's. */
export function allocationMarginWorking({ point, isReference, indexed }: BudgetSheet, row: BudgetRow): Working {
  const base = emptyWorking(`Margin of ${row.number} ${row.name} at ${point.operatingPoint}`);
  if (row.allocationHundredths === null || row.marginHundredths === null) {
    return { ...base, sentences: ["There is no margin without an allocation, nor while an item is refused."] };
  }

  const reference = indexed.terms.referenceOperatingPoint;
  return {
    ...base,
    answer: `${formatHundredths(row.marginHundredths)} N`,
    steps: [
      step({
        quantity: "Margin",
        symbol: "margin",
        formula: "allocation − P",
        withValues: `${formatHundredths(row.allocationHundredths)} − ${formatNewtonsNumber(row.predicted)}`,
        value: formatHundredths(row.marginHundredths),
      }),
    ],
    sentences: isReference
      ? []
      : [`Allocations are set at the reference operating point ${reference}: here the difference is for reading only.`],
  };
}

function movedSentence({ letter, issue }: LineRevisionView, was: string | null, now: string | null): string {
  const from = was === null ? "" : ` from ${was}`;
  return `Set${from} to ${now ?? "none"} N in issue ${issue.number}, revision ${letter} of the allocations sheet.`;
}

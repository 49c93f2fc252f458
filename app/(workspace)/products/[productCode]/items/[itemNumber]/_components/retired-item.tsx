import { Notice } from "@/app/_components/notice";
import { SectionHeading } from "@/app/_components/section-heading";
import type { LineRevisionView } from "@/lib/budget/views";
import type { LineOf } from "@/lib/evaluation/lines/line-state";

import { RevisionsTable } from "@/app/(workspace)/products/[productCode]/_components/revisions-table";

interface RetiredItemProps {
  line: LineOf<"item">;
  revisions: readonly LineRevisionView[];
  productCode: string;
}

/** A retired item has no results; its number and its revisions stay. */
export function RetiredItem({ line, revisions, productCode }: RetiredItemProps) {
  return (
    <>
      <Notice>
        Retired in issue {line.issue}. It counts in no total; its allocation went back to unallocated in the same issue.
      </Notice>
      <SectionHeading>Revisions</SectionHeading>
      <RevisionsTable revisions={revisions} productCode={productCode} />
    </>
  );
}

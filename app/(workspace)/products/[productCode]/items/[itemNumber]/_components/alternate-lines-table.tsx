import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { AlternateLines } from "@/app/(workspace)/_friction-pictures/alternate-lines";
import { SectionHeading } from "@/app/_components/section-heading";
import { methodInputOf } from "@/lib/evaluation/budget/method-input";
import { alternateLines } from "@/lib/evaluation/methods/alternate-lines";
import { formatPercent } from "@/lib/units/format-number";

import { sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import type { PointRow } from "./results-table";

interface AlternateLinesTableProps {
  shown: PointRow;
  measure: ChosenMeasure;
}

/** Every friction line whose range holds this item's Re, side by side: how much the choice of line decides. */
export function AlternateLinesTable({ shown: { sheet, row }, measure }: AlternateLinesTableProps) {
  if (row.body.method === "share") return null;
  const alternates = alternateLines(row.body.methodVersion, methodInputOf(row.body, sheet.indexed), sheet.point.stream);
  if (!alternates) return null;

  return (
    <>
      <SectionHeading aside={`spread ${formatPercent(alternates.spread, 1)} of this item's drag`}>
        By other friction lines at {sheet.point.operatingPoint}
      </SectionHeading>
      <AlternateLines
        lines={alternates.lines}
        reading={readingFor(measure, sheetBasis(sheet))}
        caption="The same item by every friction line whose range holds its Reynolds number"
      />
    </>
  );
}

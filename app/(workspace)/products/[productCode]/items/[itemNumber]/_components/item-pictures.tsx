import { FrictionPictures } from "@/app/(workspace)/_friction-pictures/friction-pictures";
import { frictionSubject } from "@/app/(workspace)/_friction-pictures/friction-subject";
import type { ChosenMeasure } from "@/app/(workspace)/_measures/chosen-measure";
import { speedReading } from "@/app/(workspace)/_measures/speed-reading";
import { SectionHeading } from "@/app/_components/section-heading";
import { methodInputOf } from "@/lib/evaluation/budget/method-input";

import { sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import type { PointRow } from "./results-table";

/** The pictures of a friction item at one operating point. */
export function ItemPictures({ shown: { sheet, row }, measure }: { shown: PointRow; measure: ChosenMeasure }) {
  if (row.body.method === "share") return null;
  const input = methodInputOf(row.body, sheet.indexed);
  const { stream, operatingPoint } = sheet.point;
  if (!frictionSubject(row.body.methodVersion, input, stream)) return null;

  return (
    <>
      <SectionHeading>The layer at {operatingPoint} in pictures</SectionHeading>
      <FrictionPictures
        version={row.body.methodVersion}
        input={input}
        stream={stream}
        name={`Item ${row.number}`}
        wide
        read={speedReading(measure, sheetBasis(sheet))}
      />
    </>
  );
}

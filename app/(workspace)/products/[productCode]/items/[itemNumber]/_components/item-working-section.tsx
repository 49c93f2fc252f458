import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { WorkingSteps, WorkingTerms } from "@/app/(workspace)/products/[productCode]/_components/working-view";
import { sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import {
  basicWorking,
  growthWorking,
  predictedWorking,
} from "@/app/(workspace)/products/[productCode]/_workings/item-working";
import { itemUncertaintyWorking } from "@/app/(workspace)/products/[productCode]/_workings/item-uncertainty-working";
import { readStep } from "@/app/(workspace)/products/[productCode]/_workings/read-step";
import type { PointRow } from "./results-table";

/** The whole calculation of an item at one operating point, from its fields to the predicted value. */
export function ItemWorking({ shown: { sheet, row }, measure }: { shown: PointRow; measure: ChosenMeasure }) {
  const basic = basicWorking(sheet, row);
  if (row.result.refused) return <p className="text-ink-2">Refused: there is nothing to write out. See the notes.</p>;
  const basis = sheetBasis(sheet);
  const read = readStep(readingFor(measure, basis), basis, row.predicted);
  const steps = [
    ...basic.steps,
    ...growthWorking(sheet, row).steps,
    ...predictedWorking(sheet, row).steps,
    ...(read ? [read] : []),
    ...(itemUncertaintyWorking(sheet, row)?.steps ?? []),
  ];

  return (
    <div className="space-y-3">
      {basic.sentences.map((sentence) => (
        <p key={sentence} className="text-sm text-ink-2">
          {sentence}
        </p>
      ))}
      {basic.terms.length > 0 ? <WorkingTerms terms={basic.terms} /> : null}
      <WorkingSteps steps={steps} />
    </div>
  );
}

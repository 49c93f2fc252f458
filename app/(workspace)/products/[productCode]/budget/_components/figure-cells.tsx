import { Cell } from "@/app/_components/table";
import { type Reading, readNumber } from "@/lib/evaluation/measures/reading";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";
import { AllocationBar } from "@/app/(workspace)/products/[productCode]/_pictures/allocation-bar";
import { isOver, type ShownRow } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";

const SUMS = [
  { figure: "basic", label: "Basic estimate" },
  { figure: "growth", label: "Growth allowance" },
  { figure: "predicted", label: "Predicted" },
] as const;

interface FigureCellsProps {
  row: ShownRow;
  isReference: boolean;
  reading: Reading;
}

/** The numbers of a row: basic, growth, predicted, allocation, margin and the small bar. */
export function FigureCells({ row, isReference, reading }: FigureCellsProps) {
  const { kind, number, allocationHundredths, marginHundredths } = row;
  const over = isReference && isOver(row);

  return (
    <>
      {SUMS.map(({ figure, label }) => (
        <Cell key={figure} numeric>
          <WorkingNumber figure={figure} of={kind} number={number} name={`${label} of ${number}`}>
            {readNumber(reading, row[figure])}
          </WorkingNumber>
        </Cell>
      ))}
      <Cell numeric>
        <WorkingNumber figure="allocation" of={kind} number={number} name={`Allocation of ${number}`}>
          {allocationHundredths === null ? "none" : readNumber(reading, allocationHundredths / 100)}
        </WorkingNumber>
      </Cell>
      <Cell numeric className={over ? "font-semibold text-signal" : undefined}>
        {marginHundredths === null ? (
          <span className="text-ink-2">–</span>
        ) : (
          <WorkingNumber figure="margin" of={kind} number={number} name={`Margin of ${number}`}>
            {readNumber(reading, marginHundredths / 100)}
          </WorkingNumber>
        )}
        {over ? <span className="block text-xs">over</span> : null}
      </Cell>
      <Cell className="max-sm:hidden">
        <AllocationBar
          basic={row.basic}
          predicted={row.predicted}
          allocation={allocationHundredths === null ? null : allocationHundredths / 100}
          judged={isReference}
        />
      </Cell>
    </>
  );
}

import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { ExceedanceWords } from "@/app/(workspace)/products/[productCode]/_components/exceedance-words";
import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";

/** Between what the total lies, in one sentence; the figures open their workings. */
export function UncertaintyHead({ frozen }: { frozen: PointUncertainty }) {
  const { low95, high95, value, standardUncertainty } = frozen.basic;

  return (
    <p className="mb-3 flex flex-wrap items-baseline gap-x-3 gap-y-0.5">
      <strong className="text-xl font-semibold" data-interval>
        <WorkingNumber figure="interval" of="total" number={null} name="95 % interval of ΣB">
          ΣB from {formatNewtonsNumber(low95)} to {formatNewtons(high95)}
        </WorkingNumber>
      </strong>
      <span className="text-sm text-ink-2">
        with 95 % probability · {formatNewtonsNumber(value)} ±{" "}
        <WorkingNumber figure="standardUncertainty" of="total" number={null} name="Standard uncertainty of ΣB">
          {formatNewtons(standardUncertainty)}
        </WorkingNumber>
        , one standard uncertainty
      </span>
      <span className="w-full text-sm text-ink-2">
        <ExceedanceWords frozen={frozen} />
      </span>
    </p>
  );
}

import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";

import { chanceText } from "../_uncertainty/chance-text";
import { WorkingNumber } from "./workings-provider";

/** Both probabilities over the limit; each opens its working. */
export function ExceedanceWords({
  frozen,
}: {
  frozen: Pick<PointUncertainty, "basicExceedsLimit" | "predictedExceedsLimit">;
}) {
  return (
    <>
      Probability that ΣB + ΣG exceeds the limit{" "}
      <WorkingNumber
        figure="predictedExceedsLimit"
        of="total"
        number={null}
        name="Probability that ΣB + ΣG exceeds the limit"
      >
        {chanceText(frozen.predictedExceedsLimit)}
      </WorkingNumber>
      , that ΣB alone does{" "}
      <WorkingNumber
        figure="basicExceedsLimit"
        of="total"
        number={null}
        name="Probability that ΣB alone exceeds the limit"
      >
        {chanceText(frozen.basicExceedsLimit)}
      </WorkingNumber>
    </>
  );
}

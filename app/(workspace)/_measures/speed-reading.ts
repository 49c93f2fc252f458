import type { SpeedReading } from "@/app/(workspace)/_friction-pictures/drag-over-speed";
import type { MeasureBasis } from "@/lib/evaluation/measures/measure-basis";
import { US_UNITS, usPerSi } from "@/lib/units/us-customary";

import { type ChosenMeasure, readingFor } from "./chosen-measure";

const METRES_PER_SECOND = { perSi: 1, unit: "m/s" };

/** How forces in one fluid are read over the speed: the dynamic pressure goes with its square. */
export function speedReading(chosen: Pick<ChosenMeasure, "measure" | "units">, basis: MeasureBasis): SpeedReading {
  const { speed: own, dynamicPressure } = basis;
  return {
    at: (speed) => readingFor(chosen, { ...basis, speed, dynamicPressure: dynamicPressure * (speed / own) ** 2 }),
    speed: chosen.units === "us" ? { perSi: usPerSi("speed"), unit: US_UNITS.speed.printed } : METRES_PER_SECOND,
  };
}

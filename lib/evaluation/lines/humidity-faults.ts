import { airCondition } from "@/lib/aero/fluids/air-condition";
import { vapourFraction } from "@/lib/aero/fluids/humid-air-density";
import type { FluidState } from "./fluid-state";

interface HumidState extends Pick<FluidState, "fluid" | "staticTemperature" | "staticPressure" | "pressureAltitude"> {
  relativeHumidity: number | null;
  humidityUncertainty: number | null;
}

interface HumidityFault {
  field: "relativeHumidity" | "humidityUncertainty";
  sentence: string;
}

/** What keeps a relative humidity from being one of this fluid at this state. */
export function humidityFaults(state: HumidState): HumidityFault[] {
  const { fluid, relativeHumidity, humidityUncertainty } = state;
  if (relativeHumidity === null) {
    return humidityUncertainty === null
      ? []
      : [{ field: "humidityUncertainty", sentence: "Give the relative humidity too, or leave both empty." }];
  }
  const sentence =
    fluid === "air" ? vapourFault(state, relativeHumidity) : "Does not belong to this fluid: leave it empty.";
  return sentence === null ? [] : [{ field: "relativeHumidity", sentence }];
}

/** Air too hot or thin for so much vapour; an incomplete state has its own faults. */
function vapourFault(state: HumidState, relativeHumidity: number): string | null {
  const condition = airCondition({
    staticTemperature: state.staticTemperature?.value,
    staticPressure: state.staticPressure?.value,
    pressureAltitude: state.pressureAltitude?.value,
  });
  if (!condition) return null;
  const { staticTemperature, staticPressure } = condition;
  return vapourFraction(staticTemperature, staticPressure, relativeHumidity) <= 1
    ? null
    : "At this temperature the vapour alone would exceed the pressure: give a lower humidity, or check both.";
}

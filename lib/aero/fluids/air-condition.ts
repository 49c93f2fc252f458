import { standardAtmosphere } from "./standard-atmosphere";

/** What is told of air: a pressure, or an altitude in its place; a temperature beside the altitude replaces the standard one. */
export interface AirTold {
  staticTemperature?: number | undefined;
  staticPressure?: number | undefined;
  pressureAltitude?: number | undefined;
}

/** Static temperature [K] and pressure [Pa] of air as told; null where they are not all told. */
export function airCondition(told: AirTold): { staticTemperature: number; staticPressure: number } | null {
  const standard = told.pressureAltitude === undefined ? null : standardAtmosphere(told.pressureAltitude);
  const staticTemperature = told.staticTemperature ?? standard?.staticTemperature;
  const staticPressure = told.staticPressure ?? standard?.staticPressure;
  return staticTemperature === undefined || staticPressure === undefined ? null : { staticTemperature, staticPressure };
}

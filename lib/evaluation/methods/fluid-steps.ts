import { AIR_GAS_CONSTANT } from "@/lib/aero/fluids/dry-air";
import { standardAtmosphere } from "@/lib/aero/fluids/standard-atmosphere";
import { sutherlandViscosity } from "@/lib/aero/fluids/sutherland-viscosity";
import { numberOf } from "../document/number-input";
import type { StreamInput } from "../document/schema";
import { FLUID_SOURCES } from "./fluid-sources";
import { freshWaterSteps } from "./fresh-water-steps";
import { humidDensitySteps } from "./humid-air-steps";
import { seaWaterSteps } from "./sea-water-steps";
import { digits, step } from "./step-text";
import type { WorkedStep } from "./worked-step";

const ALTITUDE_OF_CONSTANT_TEMPERATURE = 11000;

/** A method that takes no more than the dynamic pressure needs no viscosity. */
export interface FluidSteps {
  density: WorkedStep[];
  viscosity: WorkedStep[];
}

/** Density and viscosity of a stream from what is told of it; no steps where both were typed. */
export function fluidSteps(point: StreamInput): FluidSteps {
  switch (point.fluid) {
    case "air":
      return airSteps(point);
    case "fresh-water":
      return freshWaterSteps(numberOf(point.staticTemperature));
    case "sea-water":
      return seaWaterSteps(numberOf(point.staticTemperature));
    case "custom":
      return { density: [], viscosity: [] };
  }
}

function airSteps(point: Extract<StreamInput, { fluid: "air" }>): FluidSteps {
  const altitude = point.pressureAltitude === undefined ? null : numberOf(point.pressureAltitude);
  const standard = altitude === null ? null : standardAtmosphere(altitude);
  const temperature =
    point.staticTemperature === undefined ? standard?.staticTemperature : numberOf(point.staticTemperature);
  const pressure = point.staticPressure === undefined ? standard?.staticPressure : numberOf(point.staticPressure);
  if (temperature === undefined || pressure === undefined) return { density: [], viscosity: [] };
  const humidity = point.relativeHumidity === undefined ? null : numberOf(point.relativeHumidity);
  const density =
    humidity === null ? [dryDensityStep(temperature, pressure)] : humidDensitySteps(temperature, pressure, humidity);
  return {
    density: [...(altitude === null ? [] : standardSteps(altitude)), ...density],
    viscosity: [airViscosityStep(temperature, humidity !== null)],
  };
}

function airViscosityStep(temperature: number, isHumid: boolean): WorkedStep {
  return step(
    ["Dynamic viscosity", "μ", "Pa·s"],
    "μ = β T^1.5/(T + S)",
    `1.458e-6 · ${digits(temperature)}^1.5/(${digits(temperature)} + 110.4)`,
    sutherlandViscosity(temperature),
    { source: isHumid ? `${FLUID_SOURCES.sutherland}, as of dry air` : FLUID_SOURCES.sutherland },
  );
}

/** The standard temperature goes into the pressure, even where another temperature is told. */
function standardSteps(altitude: number): WorkedStep[] {
  const { staticTemperature, staticPressure } = standardAtmosphere(altitude);
  const capped = Math.min(altitude, ALTITUDE_OF_CONSTANT_TEMPERATURE);
  const lowerExponent = "(9.80665/(287.05287 · 0.0065))";
  const lower = `101325 · (${digits(staticTemperature)}/288.15)^${lowerExponent}`;
  const isAbove = altitude > ALTITUDE_OF_CONSTANT_TEMPERATURE;
  const decay = `e^(−9.80665 · (${digits(altitude)} − 11000)/(287.05287 · ${digits(staticTemperature)}))`;
  return [
    step(
      ["Standard temperature at the pressure altitude", "T_H", "K"],
      "T_H = T₀ − L H, H at most 11 km",
      `288.15 − 0.0065 · ${digits(capped)}`,
      staticTemperature,
      { source: FLUID_SOURCES.standardAtmosphere },
    ),
    step(
      ["Static pressure at the pressure altitude", "p", "Pa"],
      isAbove ? "p = p₀ (T_H/T₀)^(g₀/(R L)) · e^(−g₀ (H − 11 km)/(R T_H))" : "p = p₀ (T_H/T₀)^(g₀/(R L))",
      isAbove ? `${lower} · ${decay}` : lower,
      staticPressure,
      { source: FLUID_SOURCES.standardAtmosphere },
    ),
  ];
}

function dryDensityStep(temperature: number, pressure: number): WorkedStep {
  return step(
    ["Density", "ρ", "kg/m³"],
    "ρ = p/(R T)",
    `${digits(pressure)}/(287.05287 · ${digits(temperature)})`,
    pressure / (AIR_GAS_CONSTANT * temperature),
    { source: FLUID_SOURCES.dryAir },
  );
}

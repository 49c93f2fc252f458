import { airCondition } from "@/lib/aero/fluids/air-condition";
import { dryAir } from "@/lib/aero/fluids/dry-air";
import type { FluidState } from "@/lib/aero/fluids/fluid-state";
import { freshWater } from "@/lib/aero/fluids/fresh-water";
import { humidAir } from "@/lib/aero/fluids/humid-air";
import { seaWater } from "@/lib/aero/fluids/sea-water";
import { numberOf, type NumberInput } from "../document/number-input";
import type { StreamInput } from "../document/schema";

/** What every method needs to know of an operating point, SI. */
export interface StreamState extends FluidState {
  /** ν = μ/ρ, m²/s. */
  kinematicViscosity: number;
  /** q = ½ρU², Pa. */
  dynamicPressure: number;
  /** U, m/s. */
  speed: number;
  /** T [K] and p [Pa] at which the formula of humid air was used; only where it was. */
  humidAirAt?: { staticTemperature: number; staticPressure: number };
}

/** The stream of an operating point by its fluid's formulas. */
export function streamStateOf(point: StreamInput): StreamState {
  const fluid = fluidStateOf(point);
  const speed = numberOf(point.speed);
  const { density, dynamicViscosity, speedOfSound, humidAirAt } = fluid;
  const state: StreamState = {
    density,
    dynamicViscosity,
    kinematicViscosity: dynamicViscosity / density,
    dynamicPressure: 0.5 * density * speed ** 2,
    speed,
  };
  if (speedOfSound !== undefined) state.speedOfSound = speedOfSound;
  if (humidAirAt !== undefined) state.humidAirAt = humidAirAt;
  return state;
}

function fluidStateOf(point: StreamInput): Pick<StreamState, keyof FluidState | "humidAirAt"> {
  switch (point.fluid) {
    case "air":
      return airState(point);
    case "fresh-water":
      return freshWater(numberOf(point.staticTemperature));
    case "sea-water":
      return seaWater(numberOf(point.staticTemperature));
    case "custom":
      return { density: numberOf(point.density), dynamicViscosity: numberOf(point.dynamicViscosity) };
  }
}

function airState(point: Extract<StreamInput, { fluid: "air" }>): Pick<StreamState, keyof FluidState | "humidAirAt"> {
  const told = (field: NumberInput | undefined) => (field === undefined ? undefined : numberOf(field));
  const condition = airCondition({
    staticTemperature: told(point.staticTemperature),
    staticPressure: told(point.staticPressure),
    pressureAltitude: told(point.pressureAltitude),
  });
  if (!condition) throw new RangeError("air needs staticTemperature with staticPressure, or pressureAltitude");
  const { staticTemperature, staticPressure } = condition;
  if (point.relativeHumidity === undefined) return dryAir(staticTemperature, staticPressure);
  const state = humidAir(staticTemperature, staticPressure, numberOf(point.relativeHumidity));
  return { ...state, humidAirAt: condition };
}

/** The stream as a part of a body sees it whose local speed is `ratio` times that of the operating point. */
export function localStream(stream: StreamState, ratio: number): StreamState {
  if (ratio === 1) return stream;
  return { ...stream, speed: stream.speed * ratio, dynamicPressure: stream.dynamicPressure * ratio ** 2 };
}

import { dryAir } from "@/lib/aero/fluids/dry-air";
import type { FluidState } from "@/lib/aero/fluids/fluid-state";
import { freshWater } from "@/lib/aero/fluids/fresh-water";
import { seaWater } from "@/lib/aero/fluids/sea-water";
import { standardAtmosphere } from "@/lib/aero/fluids/standard-atmosphere";
import { numberOf } from "../document/number-input";
import type { FluidInput } from "../document/schema";

/** What every method needs to know of an operating point, SI. */
export interface StreamState extends FluidState {
  /** ν = μ/ρ, m²/s. */
  kinematicViscosity: number;
  /** q = ½ρU², Pa. */
  dynamicPressure: number;
  /** U, m/s. */
  speed: number;
}

/** The stream of an operating point by its fluid's formulas. */
export function streamStateOf(point: FluidInput): StreamState {
  const fluid = fluidStateOf(point);
  const speed = numberOf(point.speed);
  return {
    ...fluid,
    kinematicViscosity: fluid.dynamicViscosity / fluid.density,
    dynamicPressure: 0.5 * fluid.density * speed ** 2,
    speed,
  };
}

function fluidStateOf(point: FluidInput): FluidState {
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

function airState(point: Extract<FluidInput, { fluid: "air" }>): FluidState {
  const standard =
    point.pressureAltitude === undefined ? undefined : standardAtmosphere(numberOf(point.pressureAltitude));
  const temperature =
    point.staticTemperature === undefined ? standard?.staticTemperature : numberOf(point.staticTemperature);
  const pressure = point.staticPressure === undefined ? standard?.staticPressure : numberOf(point.staticPressure);
  if (temperature === undefined || pressure === undefined) {
    throw new RangeError("air needs staticTemperature with staticPressure, or pressureAltitude");
  }
  return dryAir(temperature, pressure);
}

/** The stream as a part of a body sees it whose local speed is `ratio` times that of the operating point. */
export function localStream(stream: StreamState, ratio: number): StreamState {
  return { ...stream, speed: stream.speed * ratio, dynamicPressure: stream.dynamicPressure * ratio ** 2 };
}

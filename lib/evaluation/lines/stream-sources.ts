import { FLUID_SOURCES } from "../methods/fluid-sources";
import type { OperatingPointBody } from "./operating-point-body";

/** By what formula a derived value of a stream was made, and from where that is. */
export interface StreamSource {
  symbol: "T, p" | "ρ" | "μ";
  source: string;
}

type PointState = Pick<OperatingPointBody, "fluid" | "pressureAltitude" | "staticTemperature" | "relativeHumidity">;

/** The formulas behind the values of an operating point that nobody typed; ν = μ/ρ and q = ½ρU² follow from them. */
export function streamSources(point: PointState): StreamSource[] {
  switch (point.fluid) {
    case "air":
      return [...standardAtmosphereSource(point), { symbol: "ρ", source: airDensity(point) }, ...airViscosity(point)];
    case "fresh-water":
      return [
        { symbol: "ρ", source: FLUID_SOURCES.freshWater },
        { symbol: "μ", source: FLUID_SOURCES.freshWater },
      ];
    case "sea-water":
      return [
        { symbol: "ρ", source: FLUID_SOURCES.seaWaterDensity },
        { symbol: "μ", source: FLUID_SOURCES.seaWaterViscosity },
      ];
    case "custom":
      return [
        { symbol: "ρ", source: "as typed" },
        { symbol: "μ", source: "as typed" },
      ];
  }
}

function standardAtmosphereSource({ pressureAltitude, staticTemperature }: PointState): StreamSource[] {
  if (pressureAltitude === null) return [];
  const what = staticTemperature === null ? "T and p" : "p";
  return [{ symbol: "T, p", source: `${what} of the standard atmosphere at that altitude (ISO 2533:1975)` }];
}

function airDensity({ relativeHumidity }: PointState): string {
  return relativeHumidity === null ? FLUID_SOURCES.dryAir : FLUID_SOURCES.humidAir;
}

function airViscosity({ relativeHumidity }: PointState): StreamSource[] {
  const { sutherland } = FLUID_SOURCES;
  return [{ symbol: "μ", source: relativeHumidity === null ? sutherland : `${sutherland}, as of dry air` }];
}

import type { OperatingPointBody } from "./operating-point-body";

/** By what formula a derived value of a stream was made, and from where that is. */
export interface StreamSource {
  symbol: "T, p" | "ρ" | "μ";
  source: string;
}

type PointState = Pick<OperatingPointBody, "fluid" | "pressureAltitude" | "staticTemperature" | "relativeHumidity">;

const SUTHERLAND = "Sutherland, β = 1.458 × 10⁻⁶ and S = 110.4 K (ISO 2533:1975)";
const FRESH_WATER = "IAPWS SR6-08(2011) at 0.1 MPa";

/** The formulas behind the values of an operating point that nobody typed; ν = μ/ρ and q = ½ρU² follow from them. */
export function streamSources(point: PointState): StreamSource[] {
  switch (point.fluid) {
    case "air":
      return [...standardAtmosphereSource(point), { symbol: "ρ", source: airDensity(point) }, ...airViscosity(point)];
    case "fresh-water":
      return [
        { symbol: "ρ", source: FRESH_WATER },
        { symbol: "μ", source: FRESH_WATER },
      ];
    case "sea-water":
      return [
        { symbol: "ρ", source: "EOS-80 at one atmosphere and salinity 35 (UNESCO 1981)" },
        { symbol: "μ", source: "Sharqawy, Lienhard and Zubair 2010 at 35 g/kg, over that of fresh water" },
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
  return relativeHumidity === null
    ? "dry air, p/(R T) with R = 287.05287 J/(kg K) (ISO 2533:1975)"
    : "humid air, CIPM-2007 with 0.0004 of CO₂ (Picard et al., Metrologia 45, 2008)";
}

function airViscosity({ relativeHumidity }: PointState): StreamSource[] {
  return [{ symbol: "μ", source: relativeHumidity === null ? SUTHERLAND : `${SUTHERLAND}, as of dry air` }];
}

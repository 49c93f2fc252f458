import { describe, expect, it } from "vitest";
import { dryAir } from "@/lib/aero/fluids/dry-air";
import { freshWater } from "@/lib/aero/fluids/fresh-water";
import {
  compressibilityFactor,
  enhancementFactor,
  humidAirDensity,
  saturationVapourPressure,
} from "@/lib/aero/fluids/humid-air-density";
import { seaWater, seaWaterDensity, seaWaterViscosity } from "@/lib/aero/fluids/sea-water";
import { geopotentialAltitude, standardAtmosphere } from "@/lib/aero/fluids/standard-atmosphere";
import { sutherlandViscosity } from "@/lib/aero/fluids/sutherland-viscosity";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors, type VectorCase } from "@/tests/vectors/read-vectors";

type Values = Record<string, number>;

function airValues(temperature: number, pressure: number): Values {
  const { density, dynamicViscosity, speedOfSound = NaN } = dryAir(temperature, pressure);
  return {
    temperature_K: temperature,
    pressure_Pa: pressure,
    density_kg_m3: density,
    dynamic_viscosity_Pa_s: dynamicViscosity,
    kinematic_viscosity_m2_s: dynamicViscosity / density,
    speed_of_sound_m_s: speedOfSound,
  };
}

function atmosphereValues(altitude: number): Values {
  const { staticTemperature, staticPressure } = standardAtmosphere(altitude);
  return { ...airValues(staticTemperature, staticPressure), geopotential_altitude_m: altitude };
}

function waterValues({ density, dynamicViscosity }: { density: number; dynamicViscosity: number }): Values {
  return {
    density_kg_m3: density,
    dynamic_viscosity_Pa_s: dynamicViscosity,
    kinematic_viscosity_m2_s: dynamicViscosity / density,
  };
}

function moistValues({ inputs }: VectorCase): Values {
  const [T, p, h, x] = ["temperature_K", "pressure_Pa", "relative_humidity", "co2_mole_fraction"].map((key) =>
    numberAt(inputs, key),
  ) as [number, number, number, number];
  const vapour = (h * enhancementFactor(T, p) * saturationVapourPressure(T)) / p;
  return {
    density_kg_m3: humidAirDensity(T, p, h, x),
    saturation_vapour_pressure_Pa: saturationVapourPressure(T),
    enhancement_factor: enhancementFactor(T, p),
    vapour_mole_fraction: vapour,
    compressibility: compressibilityFactor(T, p, vapour),
  };
}

const T = (vector: VectorCase): number => numberAt(vector.inputs, "temperature_K");

/** How each kind of case is computed; every case of the file has its kind here. */
const KINDS: Record<string, (vector: VectorCase) => Values> = {
  isa_geopotential: ({ inputs }) => atmosphereValues(numberAt(inputs, "geopotential_altitude_m")),
  isa_geometric: ({ inputs }) => atmosphereValues(geopotentialAltitude(numberAt(inputs, "geometric_altitude_m"))),
  sutherland: (vector) => ({
    mu_isa_Pa_s: sutherlandViscosity(T(vector)),
    dlnmu_dlnT_isa:
      Math.log(sutherlandViscosity(T(vector) * 1.0001) / sutherlandViscosity(T(vector) / 1.0001)) /
      2 /
      Math.log(1.0001),
  }),
  dry_air: (vector) => airValues(T(vector), numberAt(vector.inputs, "pressure_Pa")),
  moist_air_cipm2007: moistValues,
  water_iapws_sr6_08: (vector) => waterValues(freshWater(T(vector))),
  sea_water_eos80_1atm: (vector) => ({
    density_kg_m3: seaWaterDensity(T(vector), numberAt(vector.inputs, "practical_salinity")),
  }),
  sea_water_ittc_from_memory: (vector) => waterValues(seaWater(T(vector))),
  fresh_water_ittc_from_memory: (vector) => waterValues(freshWater(T(vector))),
};

/** Expected values that follow another convention than ours, and why they are not compared. */
const OTHER_CONVENTIONS: Record<string, string> = {
  "mu_ref_1p716e-5_273p15_110p4_Pa_s": "other Sutherland constants",
  "mu_ref_1p716e-5_273_111_Pa_s": "other Sutherland constants",
  density_ideal_mixture_kg_m3: "an ideal mixture, given as a cross-check within 0.2 %",
};

describe("fluids against the reference vectors", () => {
  it.each(
    readVectors("fluids.json").map((vector) => [vector.kind ?? "", JSON.stringify(vector.inputs), vector] as const),
  )("%s %s", (kind, _inputs, vector) => {
    const values = KINDS[kind]?.(vector) ?? {};
    for (const [key, expected] of Object.entries(vector.expected)) {
      if (key in OTHER_CONVENTIONS) continue;
      const tolerance = key === "dlnmu_dlnT_isa" ? 1e-7 : vector.tolerance_relative;
      expectRelative(values[key], expected as number, tolerance, key);
    }
  });
});

describe("the standard atmosphere", () => {
  it("has the printed values at 20 km (ISO 2533: 216.65 K, 5474.9 Pa)", () => {
    const { staticTemperature, staticPressure } = standardAtmosphere(20000);
    expect(staticTemperature).toBeCloseTo(216.65, 10);
    expectRelative(staticPressure, 5474.89, 1e-5);
  });

  it("has the printed values at −2 km (ISO 2533: 301.15 K, 1.27774e5 Pa)", () => {
    const { staticTemperature, staticPressure } = standardAtmosphere(-2000);
    expect(staticTemperature).toBeCloseTo(301.15, 10);
    expectRelative(staticPressure, 1.27774e5, 1e-5);
  });

  it("is continuous where the layer of constant temperature begins", () => {
    expectRelative(standardAtmosphere(11000 + 1e-6).staticPressure, standardAtmosphere(11000).staticPressure, 1e-9);
  });
});

describe("water", () => {
  it("has the density and viscosity printed in IAPWS SR6-08 at 298.15 K (997.047 kg/m³, 890.0e-6 Pa s)", () => {
    const { density, dynamicViscosity } = freshWater(298.15);
    expect(density).toBeCloseTo(997.047, 3);
    expect(dynamicViscosity * 1e6).toBeCloseTo(890.0, 0);
  });

  it("takes salt for more viscous, by 7.2 % at 15 °C (ITTC 7.5-02-01-03: 1.2201e-3 over 1.1376e-3 Pa s)", () => {
    expectRelative(seaWaterViscosity(288.15, 35), 1026.02 * 1.1892e-6, 2e-3);
    expectRelative(seaWaterViscosity(288.15, 35) / seaWaterViscosity(288.15, 0), 1.072, 2e-3);
  });
});

import {
  compressibilityFactor,
  enhancementFactor,
  humidAirDensity,
  saturationVapourPressure,
  vapourFraction,
} from "@/lib/aero/fluids/humid-air-density";
import { FLUID_SOURCES } from "./fluid-sources";
import { digits, step } from "./step-text";
import type { WorkedStep } from "./worked-step";

const SOURCE = { source: FLUID_SOURCES.humidAir };

/** From temperature, pressure and relative humidity to the density of moist air. */
export function humidDensitySteps(temperature: number, pressure: number, humidity: number): WorkedStep[] {
  const [T, p] = [digits(temperature), digits(pressure)];
  const celsius = `(${T} − 273.15)`;
  const saturation = saturationVapourPressure(temperature);
  const enhancement = enhancementFactor(temperature, pressure);
  const vapour = vapourFraction(temperature, pressure, humidity);
  const x = digits(vapour);
  const compressibility = compressibilityFactor(temperature, pressure, vapour);
  const first =
    `1.58123e-6 − 2.9331e-8 · ${celsius} + 1.1043e-10 · ${celsius}² + ` +
    `(5.707e-6 − 2.051e-8 · ${celsius}) · ${x} + (1.9898e-4 − 2.376e-6 · ${celsius}) · ${x}²`;
  return [
    step(
      ["Saturation vapour pressure", "p_sv", "Pa"],
      "p_sv = e^(A T² + B T + C + D/T)",
      `e^(1.2378847e-5 · ${T}² − 1.9121316e-2 · ${T} + 33.93711047 − 6343.1645/${T})`,
      saturation,
      SOURCE,
    ),
    step(
      ["Enhancement factor", "f", "–"],
      "f = α + β p + γ t²",
      `1.00062 + 3.14e-8 · ${p} + 5.6e-7 · ${celsius}²`,
      enhancement,
    ),
    step(
      ["Mole fraction of vapour", "x_v", "–"],
      "x_v = h f p_sv/p",
      `${digits(humidity)} · ${digits(enhancement)} · ${digits(saturation)}/${p}`,
      vapour,
    ),
    step(
      ["Compressibility factor", "Z", "–"],
      "Z = 1 − (p/T)[a₀ + a₁ t + a₂ t² + (b₀ + b₁ t) x_v + (c₀ + c₁ t) x_v²] + (p/T)² (d + e x_v²)",
      `1 − ${p}/${T} · (${first}) + (${p}/${T})² · (1.83e-11 − 0.765e-8 · ${x}²)`,
      compressibility,
    ),
    step(
      ["Density", "ρ", "kg/m³"],
      "ρ = 3.483740 × 10⁻³ · p/(Z T) · (1 − 0.3780 x_v)",
      `3.483740e-3 · ${p}/(${compressibility.toPrecision(9)} · ${T}) · (1 − 0.3780 · ${x})`,
      humidAirDensity(temperature, pressure, humidity),
      SOURCE,
    ),
  ];
}

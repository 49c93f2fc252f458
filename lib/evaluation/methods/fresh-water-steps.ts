import {
  FRESH_WATER_ALPHA_TERMS,
  FRESH_WATER_BETA_TERMS,
  FRESH_WATER_VISCOSITY_TERMS,
  FRESH_WATER_VOLUME_CONSTANT,
  freshWaterDensity,
  freshWaterViscosity,
} from "@/lib/aero/fluids/fresh-water";
import { FLUID_SOURCES } from "./fluid-sources";
import { digits, signedTerm, step } from "./step-text";
import type { WorkedStep } from "./worked-step";

const SOURCE = { source: FLUID_SOURCES.freshWater };

/** From the temperature to density and viscosity of liquid water at 0.1 MPa. */
export function freshWaterSteps(temperature: number) {
  return { density: densitySteps(temperature), viscosity: [freshWaterViscosityStep(temperature, "μ")] };
}

export function freshWaterViscosityStep(temperature: number, symbol: string): WorkedStep {
  const terms = FRESH_WATER_VISCOSITY_TERMS.map(
    ([factor, power]) => `${factor} · (${digits(temperature)}/300)^(${power})`,
  );
  return step(
    ["Dynamic viscosity of fresh water", symbol, "Pa·s"],
    `${symbol} = 10⁻⁶ Σ aᵢ (T/300 K)^bᵢ`,
    `1e-6 · (${terms.join(" + ").replaceAll("(-", "(−")})`,
    freshWaterViscosity(temperature),
    SOURCE,
  );
}

function densitySteps(temperature: number): WorkedStep[] {
  const T = digits(temperature);
  const alpha = 10 / (593 - temperature);
  const beta = 10 / (temperature - 232);
  const sum = [
    String(FRESH_WATER_VOLUME_CONSTANT),
    ...FRESH_WATER_ALPHA_TERMS.map(([factor, power]) => signedTerm(factor, `${alpha.toPrecision(8)}^${power}`)),
    ...FRESH_WATER_BETA_TERMS.map(([factor, power]) => signedTerm(factor, `${beta.toPrecision(8)}^${power}`)),
  ].join(" ");
  return [
    step(["Auxiliary quantity of the density", "α", "–"], "α = 10 K/(593 K − T)", `10/(593 − ${T})`, alpha, SOURCE),
    step(["Auxiliary quantity of the density", "β", "–"], "β = 10 K/(T − 232 K)", `10/(${T} − 232)`, beta, SOURCE),
    step(
      ["Density", "ρ", "kg/m³"],
      "ρ = p₀/(R T_r [a₅ + Σ aᵢ α^nᵢ + Σ bᵢ β^mᵢ])",
      `100000/(461.51805 · 10 · (${sum}))`,
      freshWaterDensity(temperature),
      SOURCE,
    ),
  ];
}

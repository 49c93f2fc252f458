/** State of a fluid, SI. */
export interface FluidState {
  /** ρ, kg/m³. */
  density: number;
  /** μ, Pa s. */
  dynamicViscosity: number;
  /** a, m/s; where the fluid's formulas give one (air). */
  speedOfSound?: number;
}

/**
 * Greatest roughness that leaves a turbulent layer smooth.
 *
 *   k_adm = 100 ν/U
 *
 * @param speed U [m/s], greater than 0
 * @param kinematicViscosity ν [m²/s], greater than 0
 * @returns k_adm, equivalent sand grain [m]
 *
 * Source: H. Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI. Worked: 24 m/s, 1.5e-5 m²/s give 6.25e-5 m.
 */
export function admissibleRoughness(speed: number, kinematicViscosity: number): number {
  return (100 * kinematicViscosity) / speed;
}

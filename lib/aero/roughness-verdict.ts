/** How a surface stands to the viscous length at the end of the layer. */
export type RoughnessVerdict = "smooth" | "between" | "rough";

/** Above this roughness Reynolds number k_s⁺ a surface counts as fully rough. Common practice after Nikuradse. */
export const FULLY_ROUGH_LIMIT = 70;

/**
 * Verdict on a surface's equivalent sand-grain roughness.
 *
 * smooth: k_s ≤ k_adm = 100 ν/U; rough: k_s⁺ ≥ 70; between otherwise.
 *
 * @param isSmoothEnough k_s ≤ k_adm
 * @param roughnessReynolds k_s⁺ = (U k_s/ν)·√(C_f/2), with the local C_f of the answer [-]
 *
 * Source: H. Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI (admissible roughness); the limit 70 is common
 * practice. Worked: U = 24 m/s, ν = 1.5e-5 m²/s gives k_adm = 6.25e-5 m, so 6 µm is smooth.
 */
export function roughnessVerdict(isSmoothEnough: boolean, roughnessReynolds: number): RoughnessVerdict {
  if (isSmoothEnough) return "smooth";
  return roughnessReynolds >= FULLY_ROUGH_LIMIT ? "rough" : "between";
}

interface PlateInStream {
  /** m */
  length: number;
  breadth: number;
  faces: number;
  /** m/s */
  speed: number;
  /** kg/m³ */
  density: number;
  /** Pa·s */
  viscosity: number;
}

/**
 * Drag in newtons of a smooth plate whose layer is turbulent from its edge: C_F = 0.455 / (lg Re)^2.58,
 * H. Schlichting, Boundary-Layer Theory, 7th edition, equation (21.16), on the wetted area of all faces.
 */
export function plateInWater({ length, breadth, faces, speed, density, viscosity }: PlateInStream): number {
  const reynolds = (density * speed * length) / viscosity;
  const friction = 0.455 / Math.log10(reynolds) ** 2.58;
  return friction * 0.5 * density * speed ** 2 * length * breadth * faces;
}

/** The example document of the specification. */
export const EXAMPLE = {
  operatingPoints: [
    { id: "cruise", fluid: "air", staticTemperature: 288.15, staticPressure: 101325, speed: 25 },
    { id: "tow-tank", fluid: "custom", density: 998.2, dynamicViscosity: 0.0010016, speed: 2.0 },
  ],
  items: [
    {
      id: "front",
      group: "panels",
      method: "flat-plate-friction",
      length: 2.4,
      breadth: 0.95,
      faces: 2,
      runUp: 0,
      roughness: 6e-6,
      transition: { kind: "natural", criticalReynolds: 500000 },
      frictionLine: "automatic",
      localSpeedRatio: 1,
      formFactor: 1,
    },
    { id: "trim", method: "bluff-body", dragCoefficient: 0.3, referenceArea: 0.06, shelterFactor: 1 },
    { id: "gaps", method: "share", fraction: 0.05, of: ["front"] },
  ],
};

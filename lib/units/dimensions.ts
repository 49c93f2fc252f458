/** What a number measures. SI inside; the display unit is the one an engineer reads it in. */
export interface Dimension {
  /** With its article, as it stands in a sentence: "a length". */
  noun: string;
  si: string;
  display: string;
  /** Display value = SI value × perSi. Temperatures are shifted instead: see format-quantity. */
  perSi: number;
  example: string;
}

const DIMENSION_TABLE = {
  length: { noun: "a length", si: "m", display: "m", perSi: 1, example: "8.2 m" },
  roughness: { noun: "a roughness height", si: "m", display: "µm", perSi: 1e6, example: "150 µm" },
  altitude: { noun: "an altitude", si: "m", display: "m", perSi: 1, example: "1200 m" },
  area: { noun: "an area", si: "m²", display: "m²", perSi: 1, example: "0.06 m²" },
  speed: { noun: "a speed", si: "m/s", display: "m/s", perSi: 1, example: "90 km/h" },
  temperature: { noun: "a temperature", si: "K", display: "°C", perSi: 1, example: "15 °C" },
  pressure: { noun: "a pressure", si: "Pa", display: "Pa", perSi: 1, example: "1013 hPa" },
  density: { noun: "a density", si: "kg/m³", display: "kg/m³", perSi: 1, example: "1.225 kg/m³" },
  viscosity: { noun: "a dynamic viscosity", si: "Pa·s", display: "Pa·s", perSi: 1, example: "1.79e-5 Pa·s" },
  force: { noun: "a force", si: "N", display: "N", perSi: 1, example: "12.5 N" },
} as const satisfies Record<string, Dimension>;

export type DimensionName = keyof typeof DIMENSION_TABLE;

export const DIMENSIONS: Record<DimensionName, Dimension> = DIMENSION_TABLE;

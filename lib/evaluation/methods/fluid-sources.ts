/** Where the formulas of the fluids are printed. */
export const FLUID_SOURCES = {
  standardAtmosphere: "ISO 2533:1975",
  dryAir: "dry air, p/(R T) with R = 287.05287 J/(kg K) (ISO 2533:1975)",
  humidAir: "humid air, CIPM-2007 with 0.0004 of CO₂ (Picard et al., Metrologia 45, 2008)",
  sutherland: "Sutherland, β = 1.458 × 10⁻⁶ and S = 110.4 K (ISO 2533:1975)",
  freshWater: "IAPWS SR6-08(2011) at 0.1 MPa",
  seaWaterDensity: "EOS-80 at one atmosphere and salinity 35 (UNESCO 1981)",
  seaWaterViscosity: "Sharqawy, Lienhard and Zubair 2010 at 35 g/kg, over that of fresh water",
} as const;

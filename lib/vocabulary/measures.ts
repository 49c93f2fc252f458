/** In what a drag is read, as it stands in an address. Newtons are what is kept. */
export const MEASURES = ["newtons", "drag-area", "coefficient", "counts", "power", "energy", "pascals"] as const;
export type Measure = (typeof MEASURES)[number];

export const MEASURE_NAMES: Record<Measure, string> = {
  newtons: "Force",
  "drag-area": "Drag area",
  coefficient: "Coefficient",
  counts: "Counts",
  power: "Power",
  energy: "Energy a year",
  pascals: "Pressure loss",
};

/** In which units a person reads; what is typed may be in either. */
export const UNIT_SYSTEMS = ["si", "us"] as const;

export const UNIT_SYSTEM_NAMES: Record<(typeof UNIT_SYSTEMS)[number], string> = {
  si: "SI: N, m, m/s, °C, Pa",
  us: "US customary: lbf, ft, mph, °F, lbf/ft², with SI beside",
};

/** How a person likes to read. It changes no number that is kept, signed or sent on. */
export interface Preferences {
  measure: Measure;
  units: (typeof UNIT_SYSTEMS)[number];
}

export const FIRST_PREFERENCES: Preferences = { measure: "newtons", units: "si" };

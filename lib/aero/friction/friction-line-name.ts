/** The friction lines, by the names under which they are asked for. */
export const FRICTION_LINE_NAMES = [
  "one-fifth-law",
  "one-seventh-law",
  "prandtl-schlichting",
  "schultz-grunow",
  "white",
  "karman-schoenherr",
  "ittc-1957",
  "momentum-integral",
  "fully-rough",
  "fully-rough-mills-hang",
] as const;
export type FrictionLineName = (typeof FRICTION_LINE_NAMES)[number];

/** What an item can ask for: a line by name, or the choice of one at each operating point. */
export const FRICTION_LINE_CHOICES = ["automatic", ...FRICTION_LINE_NAMES] as const;
export type FrictionLineChoice = (typeof FRICTION_LINE_CHOICES)[number];

/** Lines that stand for a surface so rough that viscosity drops out; they need a roughness above zero. */
export const FULLY_ROUGH_LINE_NAMES: readonly string[] = ["fully-rough", "fully-rough-mills-hang"];

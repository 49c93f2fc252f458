/** Maturity grades of an estimate, from the vaguest to the firmest: the order counts in steps. */
export const MATURITY_GRADES = [
  "estimated",
  "layout",
  "preliminary",
  "released",
  "measured_like_part",
  "measured_actual",
] as const;
export type MaturityGrade = (typeof MATURITY_GRADES)[number];

export const MATURITY_GRADE_NAMES: Record<MaturityGrade, string> = {
  estimated: "estimated",
  layout: "layout",
  preliminary: "preliminary",
  released: "released",
  measured_like_part: "measured on a like part",
  measured_actual: "measured, actual part",
};

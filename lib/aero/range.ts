/** A stated range of validity. It is data beside a formula: the formula does not clamp, the answer says so. */
export interface Range {
  min: number;
  max: number;
}

export function within(value: number, { min, max }: Range): boolean {
  return value >= min && value <= max;
}

/** How far a value lies outside a range, as a factor of at least 1; 1 inside. */
export function factorOutside(value: number, { min, max }: Range): number {
  if (value < min) return min / value;
  return value > max ? value / max : 1;
}

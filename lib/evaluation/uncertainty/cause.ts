/** Where an uncertain quantity stands; `method` is the bias that a friction line or a method brings by itself. */
export const CAUSE_ORIGINS = ["operating_point", "terms", "finish", "item", "method"] as const;
export type CauseOrigin = (typeof CAUSE_ORIGINS)[number];

/** One uncertain quantity, drawn once for all that depends on it. */
export interface Cause {
  /** `operating_point:OP-1:speed`, `item:010:length`, `method:one-fifth-law` */
  key: string;
  origin: CauseOrigin;
  /** The number of the line, or the name of the friction line or method. */
  name: string;
  /** The field of that line; null for a bias. */
  field: string | null;
  /** SI; 1 for a bias, which is a factor. */
  value: number;
  standardUncertainty: number;
  /** What it can be at all: draws stay between. */
  lowest: number;
  highest: number;
}

export type CauseSketch = Omit<Cause, "key">;

export function causeKey({ origin, name, field }: Pick<Cause, "origin" | "name" | "field">): string {
  return field === null ? `${origin}:${name}` : `${origin}:${name}:${field}`;
}

/** The causes of a budget in the order in which they were met, each once. */
export class CauseList {
  readonly causes: Cause[] = [];
  private readonly places = new Map<string, number>();

  /** The place of a cause in the list. */
  place(sketch: CauseSketch): number {
    const key = causeKey(sketch);
    const known = this.places.get(key);
    if (known !== undefined) return known;
    this.places.set(key, this.causes.length);
    return this.causes.push({ key, ...sketch }) - 1;
  }
}

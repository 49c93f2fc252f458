/** Where a layer turns turbulent, in Re from its start. */
export type Transition = { kind: "from-start" } | { kind: "at"; reynolds: number } | { kind: "never" };

/** Two numbers that differ by less are the same place: what is typed as one length comes out so by different sums. */
const SAME_PLACE = 1e-12;

/** Whether a layer that has come to this Re lies beyond its transition. At the very place it is laminar still. */
export function isBeyond(reynolds: number, transitionReynolds: number): boolean {
  return reynolds > transitionReynolds * (1 + SAME_PLACE);
}

/** Whether a value lies below a limit by more than the rounding of its making. */
export function isBelow(value: number, limit: number): boolean {
  return value < limit * (1 - SAME_PLACE);
}

/** Where a layer turns turbulent, in Re from its start. */
export type Transition = { kind: "from-start" } | { kind: "at"; reynolds: number } | { kind: "never" };

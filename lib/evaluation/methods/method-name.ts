export const METHOD_NAMES = [
  "flat-plate-friction",
  "duct-entry",
  "loss-coefficient",
  "bluff-body",
  "drag-area",
  "measured",
  "fixed",
  "share",
] as const;
export type MethodName = (typeof METHOD_NAMES)[number];

export type NoteSeverity = "information" | "caution" | "refusal";

/** Every code a result can carry. What each means stands in the note catalogue. */
export const NOTE_CODES = [
  "automatic-choice",
  "blasius-below-crossing",
  "thickness-by-wall-and-wake",
  "regime-between",
  "rough-line-governs-smooth-surface",
  "roughness-turbulent-from-start",
  "duct-friction-reads-low",
  "fully-developed-cross-check",
  "reynolds-outside-line-range",
  "roughness-ratio-outside-range",
  "laminar-above-critical",
  "laminar-behind-body",
  "laminar-on-rough-surface",
  "roughness-above-admissible",
  "fully-rough-line-on-smoother-surface",
  "layers-meet-in-duct",
  "mach-above-limit",
  "humid-air-outside-range",
  "measured-reynolds-differs",
  "fresh-leading-edge-behind",
  "same-surface-twice",
  "reynolds-outside-every-line",
  "transition-below-limit",
  "duct-blocked",
  "share-circle",
  "share-of-refused",
] as const;
export type NoteCode = (typeof NOTE_CODES)[number];

import type { NoteSeverity } from "@/lib/evaluation/notes/note-code";

/** One line of a working, printed. */
export interface WorkingStep {
  quantity: string;
  /** With "_" before what stands below. */
  symbol: string;
  formula: string;
  withValues: string;
  value: string;
  unit: string;
  source: string | null;
  range: string | null;
}

/** A part that is added up: "010 Roof shell", "5.39". */
export interface WorkingTerm {
  label: string;
  value: string;
}

export interface WorkingNote {
  code: string;
  severity: NoteSeverity;
  sentence: string;
  /** What the owner wrote about why it may stand. */
  justification: string | null;
}

/** How a number came about: what opens when it is asked. */
export interface Working {
  title: string;
  /** The number as printed, with its unit; null where there is none. */
  answer: string | null;
  steps: WorkingStep[];
  terms: WorkingTerm[];
  /** Where it comes from, in sentences. */
  sentences: string[];
  notes: WorkingNote[];
  /** Further pages, as paths below the product. */
  links: { path: string; label: string }[];
}

export const FIGURES = [
  "basic",
  "growth",
  "predicted",
  "predictedWithoutSavings",
  "allocation",
  "margin",
  "clearOfReserve",
  "limit",
  "reserve",
  "unallocated",
  "interval",
  "standardUncertainty",
  "basicExceedsLimit",
  "predictedExceedsLimit",
] as const;
export type Figure = (typeof FIGURES)[number];

export const FIGURE_OWNERS = ["item", "group", "total", "cause", "run"] as const;

/** Which number is asked about: of an item, of a group, of the whole sheet, of a cause of its uncertainty, of a run. */
export interface FigureQuestion {
  figure: Figure;
  of: (typeof FIGURE_OWNERS)[number];
  /** An item's or group's number, a cause's key, a run's id. */
  number: string | null;
}

import { METHOD_NAMES, type MethodName } from "./method-name";

/** One published version of a method. It is never edited: what changes is published as the next. */
export interface MethodVersion {
  version: number;
  /** What tells it from the others, in a sentence. */
  what: string;
  source: string;
}

const FIRST = "As first published.";
const SCHLICHTING = "Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI";

const FRICTION_VERSIONS: readonly MethodVersion[] = [
  {
    version: 1,
    what: "One-fifth law with 0.074 (mean) and 0.0592 (local), adjusted to tests; every other line as printed.",
    source: `Prandtl 1927; ${SCHLICHTING}.`,
  },
  {
    version: 2,
    what:
      "One-fifth law with 0.072 (mean) and 0.0576 (local), as the momentum integral gives them, 2.7 % lower; " +
      "every other line as in version 1.",
    source: `von Kármán 1921, Prandtl 1921; ${SCHLICHTING}.`,
  },
];

function first(source: string): readonly MethodVersion[] {
  return [{ version: 1, what: FIRST, source }];
}

/** Every version of every method, the first one first; all of them stay computable, for the issues that name them. */
export const METHOD_VERSIONS: Record<MethodName, readonly MethodVersion[]> = {
  "flat-plate-friction": FRICTION_VERSIONS,
  "duct-entry": FRICTION_VERSIONS,
  "loss-coefficient": first("Definition of the loss coefficient."),
  "bluff-body": first("Definition of the drag coefficient."),
  "drag-area": first("Definition of the drag area."),
  measured: first("Dynamic similarity: force over dynamic pressure."),
  fixed: first("The force as it was given."),
  share: first("A fraction of the members’ sum."),
};

export function newestVersionOf(method: MethodName): number {
  return METHOD_VERSIONS[method].at(-1)?.version ?? 1;
}

/** By what is computed where no budget says otherwise: the document of the command line and a trial name no versions. */
export const FIRST_METHOD_VERSION = 1;

/** Methods that a budget could move to another version of. */
export const METHODS_WITH_VERSIONS: readonly MethodName[] = METHOD_NAMES.filter(
  (method) => METHOD_VERSIONS[method].length > 1,
);

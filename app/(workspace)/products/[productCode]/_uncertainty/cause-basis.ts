import type { LineState } from "@/lib/evaluation/lines/line-state";
import { OWN_UNCERTAINTIES } from "@/lib/evaluation/methods/own-uncertainties";

/** Whether a standard uncertainty has a source, or is what somebody judged it to be. */
export interface CauseBasis {
  kind: "source" | "judgement";
  text: string;
}

const JUDGEMENT = /^judgement:?\s*/i;

/** Whence a line or a method has what it is uncertain by. */
export function methodBasis(name: string): CauseBasis {
  const own = Object.entries(OWN_UNCERTAINTIES).find(([each]) => each === name)?.[1];
  const text = own?.source ?? "";
  return JUDGEMENT.test(text) ? { kind: "judgement", text: text.replace(JUDGEMENT, "") } : { kind: "source", text };
}

/** A coefficient stands with its own source; a length or a speed with the evidence that its item may cite. */
export function lineBasis(line: LineState, field: string): CauseBasis {
  const stated = `stated in revision ${line.letter}`;
  if (line.kind === "finish") return { kind: "source", text: line.body.source };
  if (line.kind !== "item") return { kind: "judgement", text: `${stated}, which names no source` };
  if (isSourced(field) && "source" in line.body && line.body.source !== "") {
    return { kind: "source", text: line.body.source };
  }
  const citations = line.body.evidence.map(({ document, revision }) => `${document} rev. ${revision}`);
  return citations.length > 0
    ? { kind: "source", text: `evidence of the item: ${citations.join(", ")}` }
    : { kind: "judgement", text: `${stated}, which cites no evidence` };
}

/** What the source of a method's body speaks of. */
function isSourced(field: string): boolean {
  return SOURCED.has(field) || field.startsWith("test");
}

const SOURCED = new Set(["dragCoefficient", "lossCoefficient", "dragArea", "force", "fraction"]);

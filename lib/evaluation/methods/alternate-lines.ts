import { AUTOMATIC_RANGE } from "@/lib/aero/friction/automatic-layer";
import { FRICTION_LINE_CHOICES, type FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { within } from "@/lib/aero/range";
import { numberOf } from "../document/number-input";
import type { InputOf, MethodInput } from "../document/schema";
import { frictionLinesOf } from "./friction-versions";
import { evaluateMethod } from "./method-registry";
import type { MethodAnswer } from "./method-answer";
import type { StreamState } from "./stream-state";

export interface AlternateLine {
  line: FrictionLineName | "automatic";
  title: string;
  drag: number;
  meanCoefficient: number;
  /** drag over the item's own drag, less 1. */
  difference: number;
  /** The line stands for a surface of this item's verdict. */
  fitsSurface: boolean;
  isItemsOwn: boolean;
}

export interface AlternateLines {
  lines: AlternateLine[];
  /** (greatest − least drag) over the item's own drag, of the lines that fit the surface. */
  spread: number;
}

/**
 * Every friction line whose range holds this item's Re, side by side, with the item's own among them. Nothing where the
 * method has no friction line or the item is refused.
 */
export function alternateLines(version: number, input: MethodInput, stream: StreamState): AlternateLines | null {
  if (input.method !== "flat-plate-friction" && input.method !== "duct-entry") return null;
  const own = answerBy(version, input, input.frictionLine, stream);
  if (!own) return null;
  const known = frictionLinesOf(version);
  const lines = FRICTION_LINE_CHOICES.flatMap((line) => {
    const isItemsOwn = line === input.frictionLine;
    if (!isItemsOwn && !isValid(known, line, own, numberOf(input.roughness))) return [];
    const answer = answerBy(version, input, line, stream);
    if (answer?.meanCoefficient === undefined) return [];
    return [
      {
        line,
        title: line === "automatic" ? "Automatic" : known[line].title,
        drag: answer.drag,
        meanCoefficient: answer.meanCoefficient,
        difference: answer.drag / own.drag - 1,
        fitsSurface: fits(known, line, own),
        isItemsOwn,
      },
    ];
  });
  const drags = lines.filter(({ fitsSurface }) => fitsSurface).map(({ drag }) => drag);
  return { lines, spread: drags.length < 2 ? 0 : (Math.max(...drags) - Math.min(...drags)) / own.drag };
}

function answerBy(
  version: number,
  input: InputOf<"flat-plate-friction" | "duct-entry">,
  frictionLine: FrictionLineName | "automatic",
  stream: StreamState,
): MethodAnswer | null {
  const outcome = evaluateMethod(input.method, version, { ...input, frictionLine }, stream);
  return outcome.outcome === "answer" ? outcome.answer : null;
}

function isValid(
  lines: FrictionLines,
  line: FrictionLineName | "automatic",
  own: MethodAnswer,
  roughness: number,
): boolean {
  const reynolds = own.reynolds ?? 0;
  if (line === "automatic") return within(reynolds, AUTOMATIC_RANGE);
  const { reynoldsRange, surface } = lines[line];
  return within(reynolds, reynoldsRange) && (surface !== "rough" || roughness > 0);
}

function fits(lines: FrictionLines, line: FrictionLineName | "automatic", { roughnessVerdict }: MethodAnswer): boolean {
  if (line === "automatic") return true;
  const { surface } = lines[line];
  return surface === "any" || (surface === "smooth" ? roughnessVerdict === "smooth" : roughnessVerdict === "rough");
}

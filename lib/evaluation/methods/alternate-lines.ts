import { AUTOMATIC_RANGE } from "@/lib/aero/friction/automatic-layer";
import { FRICTION_LINE_CHOICES, type FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import { within } from "@/lib/aero/range";
import { numberOf } from "../document/number-input";
import type { InputOf, MethodInput } from "../document/schema";
import { CURRENT_METHOD_VERSIONS, evaluateMethod } from "./method-registry";
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
export function alternateLines(input: MethodInput, stream: StreamState): AlternateLines | null {
  if (input.method !== "flat-plate-friction" && input.method !== "duct-entry") return null;
  const own = answerBy(input, input.frictionLine, stream);
  if (!own) return null;
  const lines = FRICTION_LINE_CHOICES.flatMap((line) => {
    const isItemsOwn = line === input.frictionLine;
    if (!isItemsOwn && !isValid(line, own, numberOf(input.roughness))) return [];
    const answer = answerBy(input, line, stream);
    if (answer?.meanCoefficient === undefined) return [];
    return [
      {
        line,
        title: line === "automatic" ? "Automatic" : FRICTION_LINES[line].title,
        drag: answer.drag,
        meanCoefficient: answer.meanCoefficient,
        difference: answer.drag / own.drag - 1,
        fitsSurface: fits(line, own),
        isItemsOwn,
      },
    ];
  });
  const drags = lines.filter(({ fitsSurface }) => fitsSurface).map(({ drag }) => drag);
  return { lines, spread: drags.length < 2 ? 0 : (Math.max(...drags) - Math.min(...drags)) / own.drag };
}

function answerBy(
  input: InputOf<"flat-plate-friction" | "duct-entry">,
  frictionLine: FrictionLineName | "automatic",
  stream: StreamState,
): MethodAnswer | null {
  const outcome = evaluateMethod(
    input.method,
    CURRENT_METHOD_VERSIONS[input.method],
    { ...input, frictionLine },
    stream,
  );
  return outcome.outcome === "answer" ? outcome.answer : null;
}

function isValid(line: FrictionLineName | "automatic", own: MethodAnswer, roughness: number): boolean {
  const reynolds = own.reynolds ?? 0;
  if (line === "automatic") return within(reynolds, AUTOMATIC_RANGE);
  const { reynoldsRange, surface } = FRICTION_LINES[line];
  return within(reynolds, reynoldsRange) && (surface !== "rough" || roughness > 0);
}

function fits(line: FrictionLineName | "automatic", { roughnessVerdict }: MethodAnswer): boolean {
  if (line === "automatic") return true;
  const { surface } = FRICTION_LINES[line];
  return surface === "any" || (surface === "smooth" ? roughnessVerdict === "smooth" : roughnessVerdict === "rough");
}

import { evaluateDocument } from "@/lib/evaluation/document/evaluate-document";
import { faultLine, faultsOf } from "@/lib/evaluation/document/faults";
import { EvaluationDocument } from "@/lib/evaluation/document/schema";
import type { ItemAnswer } from "@/lib/evaluation/document/answer";

export type AnsweredItem = Exclude<ItemAnswer, { refused: string }>;

/** Air at sea level of the standard atmosphere and 25 m/s. */
export const AIR = { fluid: "air", staticTemperature: 288.15, staticPressure: 101325, speed: 25 };

/** A custom fluid of density 1 in which Re of a length is 1e6 times that length, at 10 m/s. */
export const PLAIN = { fluid: "custom", density: 1, dynamicViscosity: 1e-5, speed: 10 };

export const PLATE = { method: "flat-plate-friction", length: 2, breadth: 1, faces: 1 };

export function evaluateItems(point: object, items: object[]): ItemAnswer[] {
  const parsed = EvaluationDocument.safeParse({
    operatingPoints: [{ id: "point", ...point }],
    items: items.map((item, index) => ({ id: `item-${index}`, ...item })),
  });
  if (!parsed.success) throw new Error(faultsOf(parsed.error).map(faultLine).join("\n"));
  return evaluateDocument(parsed.data).operatingPoints[0]?.items ?? [];
}

/** The answer of one item, which must not be refused. */
export function answerOf(point: object, item: object): AnsweredItem {
  const [answer] = evaluateItems(point, [item]);
  if (!answer || "refused" in answer) throw new Error(`refused: ${answer?.refused}`);
  return answer;
}

/** The sentence of one item, which must be refused. */
export function refusalOf(point: object, item: object): string {
  const [answer] = evaluateItems(point, [item]);
  if (!answer || !("refused" in answer)) throw new Error("not refused");
  return answer.refused;
}

export function noteCodes(point: object, item: object): string[] {
  return answerOf(point, item).notes.map(({ code }) => code);
}

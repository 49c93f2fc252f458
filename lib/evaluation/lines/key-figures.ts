import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import type { MethodAnswer } from "@/lib/evaluation/methods/method-answer";
import { formatExact, formatPercent, formatSignificant } from "@/lib/units/format-number";
import { formatQuantity, formatResult, formatResultIn } from "@/lib/units/format-quantity";
import type { UnitSystem } from "@/lib/units/us-customary";

export interface KeyFigure {
  /** With "_" before what stands below: "C_F". */
  symbol: string;
  text: string;
}

/** The two or three figures by which an engineer recognises a result. */
export function keyFigures(body: ItemBody, answer: MethodAnswer | null, units: UnitSystem): KeyFigure[] {
  switch (body.method) {
    case "flat-plate-friction":
      return layerFigures(answer);
    case "duct-entry":
      return [...layerFigures(answer), ...pressureFigure(answer, units)];
    case "loss-coefficient":
      return [{ symbol: "K", text: formatExact(body.lossCoefficient) }, ...pressureFigure(answer, units)];
    case "bluff-body":
      return [
        { symbol: "C_D", text: formatExact(body.dragCoefficient) },
        { symbol: "A", text: formatQuantity(body.referenceArea.value, "area", units) },
        ...(body.shelterFactor === 1 ? [] : [{ symbol: "shelter", text: formatExact(body.shelterFactor) }]),
      ];
    case "drag-area":
      return [{ symbol: "C_D·A", text: formatQuantity(body.dragArea.value, "area", units) }];
    case "measured":
      return [
        { symbol: "F", text: formatQuantity(body.force.value, "force", units) },
        { symbol: "at", text: formatQuantity(body.testSpeed.value, "speed", units) },
      ];
    case "fixed":
      return [];
    case "share":
      return [{ symbol: "share", text: `${formatPercent(body.fraction)} of ${membersText(body)}` }];
  }
}

function layerFigures(answer: MethodAnswer | null): KeyFigure[] {
  if (!answer) return [];
  const { meanCoefficient, reynolds, roughnessVerdict } = answer;
  return [
    ...(meanCoefficient === undefined ? [] : [{ symbol: "C_F", text: formatSignificant(meanCoefficient) }]),
    ...(reynolds === undefined ? [] : [{ symbol: "Re", text: formatSignificant(reynolds) }]),
    ...(roughnessVerdict === undefined ? [] : [{ symbol: "surface", text: roughnessVerdict }]),
  ];
}

function pressureFigure(answer: MethodAnswer | null, units: UnitSystem): KeyFigure[] {
  const loss = answer?.pressureLoss;
  if (loss === undefined) return [];
  return [{ symbol: "Δp", text: formatResultIn(units, loss, "pressure", formatResult(loss, "Pa")) }];
}

function membersText({ of, ofGroup }: Extract<ItemBody, { method: "share" }>): string {
  return ofGroup === null ? of.join(", ") : `group ${ofGroup}`;
}

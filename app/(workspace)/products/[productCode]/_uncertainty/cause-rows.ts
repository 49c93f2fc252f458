import { fieldsOfBody } from "@/lib/evaluation/lines/field-catalogue";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";
import { lineTitle } from "@/lib/evaluation/notes/line-title";
import { budgetModel } from "@/lib/evaluation/uncertainty/budget-model";
import type { CauseShare, PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import type { Cause } from "@/lib/evaluation/uncertainty/cause";
import { DIMENSIONS } from "@/lib/units/dimensions";
import { formatExact, formatPercent, formatSignificant, THIN_SPACE } from "@/lib/units/format-number";
import { formatQuantity } from "@/lib/units/format-quantity";
import type { LineKind } from "@/lib/vocabulary/lines";

import type { BudgetSheet } from "../_sheet/budget-sheet";
import { type CauseBasis, lineBasis, methodBasis } from "./cause-basis";

/** One cause of the uncertainty of ΣB, in words. */
export interface CauseRow {
  key: string;
  /** "Speed", "Bias of the line". */
  what: string;
  /** "OP-1 motorway", "010 Side panels", "1/5-power law". */
  where: string;
  symbol: string;
  /** As the issue states it, with its unit; null for a bias, which is a factor of 1. */
  value: string | null;
  standardUncertainty: string;
  newtons: number;
  /** Of the variance of ΣB. */
  share: number;
  basis: CauseBasis;
}

/** The causes as the issue froze them, the greatest first, with what their lines say of them. */
export function causeRows(sheet: BudgetSheet, frozen: PointUncertainty): CauseRow[] {
  const model = budgetModel(sheet.budget.state, sheet.point);
  const causes = new Map("refused" in model ? [] : model.causes.map((cause) => [cause.key, cause]));
  return frozen.causes.flatMap((share) => {
    const cause = causes.get(share.key);
    if (!cause) return [];
    const row = cause.field === null ? biasRow(cause, share) : fieldRow(cause, cause.field, share, sheet);
    return row ? [row] : [];
  });
}

function biasRow(cause: Cause, { newtons, share }: CauseShare): CauseRow {
  const method = METHOD_NAMES.find((name) => name === cause.name);
  return {
    key: cause.key,
    what: method ? "Bias of the method" : "Bias of the line",
    where: method ? ITEM_METHODS[method].label : lineTitle(cause.name),
    symbol: "",
    value: null,
    standardUncertainty: `${formatPercent(cause.standardUncertainty)} of what it gives`,
    newtons,
    share,
    basis: methodBasis(cause.name),
  };
}

function fieldRow(cause: Cause, field: string, share: CauseShare, { budget }: BudgetSheet): CauseRow | null {
  const line = budget.state.lines.find(({ kind, number }) => kind === kindOf(cause) && number === cause.name);
  if (!line) return null;
  const spec = fieldsOfBody(line.kind, line.body).find(({ key }) => key === field);
  return {
    key: cause.key,
    what: spec?.label ?? field,
    where: whereOf(line),
    symbol: spec?.symbol ?? "",
    ...printed(cause, spec),
    newtons: share.newtons,
    share: share.share,
    basis: lineBasis(line, field),
  };
}

function kindOf({ origin }: Cause): LineKind | null {
  return origin === "method" ? null : origin;
}

function whereOf(line: LineState): string {
  return line.kind === "terms" ? lineName(line) : `${line.number} ${lineName(line)}`;
}

function printed(
  { value, standardUncertainty }: Cause,
  spec: FieldSpec | undefined,
): Pick<CauseRow, "value" | "standardUncertainty"> {
  if (spec?.type.type !== "quantity") {
    return { value: formatExact(value), standardUncertainty: formatSignificant(standardUncertainty) };
  }
  const { dimension } = spec.type;
  const { display, si, perSi } = DIMENSIONS[dimension];
  // A spread of temperatures is a difference: kelvins.
  const unit = dimension === "temperature" ? si : display;
  return {
    value: formatQuantity(value, dimension),
    standardUncertainty: `${formatSignificant(standardUncertainty * perSi)}${THIN_SPACE}${unit}`,
  };
}

import { methodInputOf, streamInputOf } from "@/lib/evaluation/budget/method-input";
import { shareMembers } from "@/lib/evaluation/budget/share-members";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { workedSteps } from "@/lib/evaluation/methods/worked-steps";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatExact, formatPercent, formatSignificant } from "@/lib/units/format-number";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";

import type { BudgetSheet, ItemRow } from "../_sheet/budget-sheet";
import { printedStep } from "./printed-step";
import type { Working, WorkingNote, WorkingStep, WorkingTerm } from "./working";

/** How an item's basic estimate came about, step by step as a hand calculator can repeat it. */
export function basicWorking(sheet: BudgetSheet, row: ItemRow): Working {
  const { result, body } = row;
  const method = ITEM_METHODS[body.method];

  return {
    ...itemWorking(sheet, row, "Basic estimate"),
    answer: result.refused ? null : formatNewtons(row.basic),
    steps: [...methodSteps(sheet, row), ...flowAreaStep(sheet, row)],
    terms: shareTerms(sheet, body),
    sentences: [`${method.label}, version ${result.methodVersion}. ${method.summary}`, ...sourceOf(body)],
    notes: itemNotes(row),
  };
}

/** Growth: the size of the basic estimate times the fraction of the maturity grade. */
export function growthWorking(sheet: BudgetSheet, row: ItemRow): Working {
  const { growthFraction } = row.result;
  const grade = MATURITY_GRADE_NAMES[row.body.grade];

  return {
    ...itemWorking(sheet, row, "Growth allowance"),
    answer: formatNewtons(row.growth),
    steps: [
      step({
        quantity: "Growth allowance",
        symbol: "G",
        formula: "G = |B| · g",
        withValues: `|${formatNewtonsNumber(row.basic)}| · ${formatExact(growthFraction)}`,
        value: formatNewtonsNumber(row.growth),
        source: `Growth table of the terms: ${grade} ${formatPercent(growthFraction)} of the basic estimate.`,
      }),
    ],
    sentences: row.body.saving ? ["A saving is counted on less than in full: its growth shrinks it."] : [],
  };
}

export function predictedWorking(sheet: BudgetSheet, row: ItemRow): Working {
  return {
    ...itemWorking(sheet, row, "Predicted"),
    answer: formatNewtons(row.predicted),
    steps: [
      step({
        quantity: "Predicted",
        symbol: "P",
        formula: "P = B + G",
        withValues: `${formatNewtonsNumber(row.basic)} + ${formatNewtonsNumber(row.growth)}`,
        value: formatNewtonsNumber(row.predicted),
      }),
    ],
    notes: itemNotes(row),
  };
}

/** What all workings of an item share: its name and where to read on. */
export function itemWorking({ point }: BudgetSheet, { number, name }: ItemRow, figure: string): Working {
  return {
    title: `${figure} of ${number} ${name} at ${point.operatingPoint}`,
    answer: null,
    steps: [],
    terms: [],
    sentences: [],
    notes: [],
    links: [{ path: `items/${encodeURIComponent(number)}`, label: `Item ${number}: fields, revisions, evidence` }],
  };
}

export function itemNotes({ result, body }: ItemRow): WorkingNote[] {
  return result.notes.map((note) => ({
    code: note.code,
    severity: note.severity,
    sentence: noteSentence(note),
    justification: body.justifications.find(({ code }) => code === note.code)?.text ?? null,
  }));
}

/** A step in newtons. */
export function step(given: Partial<WorkingStep> & Pick<WorkingStep, "quantity" | "symbol" | "value">): WorkingStep {
  return { formula: "", withValues: "", unit: "N", source: null, range: null, ...given };
}

function methodSteps({ indexed, point }: BudgetSheet, { body, result }: ItemRow): WorkingStep[] {
  if (body.method === "share") {
    return result.refused ? [] : [shareStep(body, result.basic)];
  }
  const stream = indexed.operatingPoints.get(point.operatingPoint);
  if (!stream) throw new RangeError(`no operating point ${point.operatingPoint} in force`);
  const input = methodInputOf(body, indexed);
  return workedSteps(body.method, result.methodVersion, input, streamInputOf(stream)).map(printedStep);
}

function shareStep(body: Extract<ItemBody, { method: "share" }>, basic: number): WorkingStep {
  const sum = body.fraction === 0 ? "ΣB" : formatNewtonsNumber(basic / body.fraction);
  return step({
    quantity: "Share of the members",
    symbol: "B",
    formula: "B = share · ΣB of the members",
    withValues: `${formatExact(body.fraction)} · ${sum}`,
    value: formatNewtonsNumber(basic),
  });
}

function shareTerms({ indexed, rows }: BudgetSheet, body: ItemBody): WorkingTerm[] {
  if (body.method !== "share") return [];
  return shareMembers(body, indexed).map((number) => {
    const member = rows.find((row) => row.kind === "item" && row.number === number);
    return { label: `${number} ${member?.name ?? ""}`, value: formatNewtonsNumber(member?.basic ?? 0) };
  });
}

/** In a duct every pressure loss counts on the product's flow area, whatever the item's own section. */
function flowAreaStep({ budget, indexed }: BudgetSheet, { result, basic }: ItemRow): WorkingStep[] {
  const loss = result.answer?.pressureLoss;
  const area = indexed.terms.flowArea?.value;
  if (budget.product.kind !== "duct" || loss === undefined || area === undefined) return [];
  return [
    step({
      quantity: "Force on the product's flow area",
      symbol: "B",
      formula: "B = Δp · A_flow",
      withValues: `${formatSignificant(loss, 4)} · ${formatExact(area)}`,
      value: formatNewtonsNumber(basic),
      source: "Flow area of the terms, so that pascals add up.",
    }),
  ];
}

function sourceOf(body: ItemBody): string[] {
  const source = "source" in body && body.source !== "" ? [`Source: ${body.source}`] : [];
  return body.basis === "" ? source : [...source, `Booked here because: ${body.basis}`];
}

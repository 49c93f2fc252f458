import { z } from "zod";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import type { BudgetResults, ItemResult, PointResult, PointTotals } from "@/lib/evaluation/budget/results";
import { itemsInSheetOrder } from "@/lib/evaluation/budget/sheet-order";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import type { MethodAnswer } from "@/lib/evaluation/methods/method-answer";
import type { Note } from "@/lib/evaluation/notes/note";
import { roundStored } from "@/lib/units/rounding";
import { STANDING_ORDER } from "@/lib/vocabulary/standing";

/** What an issue keeps of an operating point beside the rows of its items. */
export type StoredPoint = PointTotals;
export interface StoredTotals {
  worstPoint: string;
  points: StoredPoint[];
}

/** An item's result as its row holds it; `answer` and `notes` are JSON text. */
export interface StoredResult {
  item: string;
  operatingPoint: string;
  methodVersion: number;
  basic: number;
  growthFraction: number;
  growth: number;
  predicted: number;
  answer: string;
  notes: string;
}

/** Totals, limits and streams of all points, every number rounded to 12 significant digits. */
export function totalsToStore({ worstPoint, points }: BudgetResults): StoredTotals {
  return { worstPoint, points: points.map(roundedPoint) };
}

export function parseTotals(text: string): StoredTotals {
  return StoredTotalsText.parse(JSON.parse(text));
}

/** What a row's two texts hold: the method's answer and why there is none; the notes. */
export function textsToStore({ answer, refused, notes }: ItemResult): { answer: object; notes: readonly Note[] } {
  return { answer: { answer, refused }, notes };
}

/** The results of an issue put together again from its totals and the rows in force, in the order of its sheet. */
export function assembleResults(
  state: BudgetState,
  totals: StoredTotals,
  rows: readonly StoredResult[],
): BudgetResults {
  const order = itemsInSheetOrder(indexState(state));
  const byPair = new Map(rows.map((row) => [`${row.operatingPoint} ${row.item}`, row]));
  const points = totals.points.map((point) => ({
    ...point,
    items: order.map((item) => toItemResult(byPair.get(`${point.operatingPoint} ${item}`), item, point.operatingPoint)),
  }));
  return { worstPoint: totals.worstPoint, points };
}

function toItemResult(row: StoredResult | undefined, item: string, operatingPoint: string): ItemResult {
  if (!row) throw new Error(`The stored results have none for item ${item} at ${operatingPoint}.`);
  const { answer, refused } = StoredAnswerText.parse(JSON.parse(row.answer));
  const { methodVersion, basic, growthFraction, growth, predicted } = row;
  const notes = z.array(StoredNote).parse(JSON.parse(row.notes));
  return { item, operatingPoint, methodVersion, basic, growthFraction, growth, predicted, answer, notes, refused };
}

function roundedPoint(point: PointResult): StoredPoint {
  const { operatingPoint, name, stream, limitHundredths, reserveHundredths, totals, standing } = point;
  const roundedStream = {
    density: roundStored(stream.density),
    dynamicViscosity: roundStored(stream.dynamicViscosity),
    kinematicViscosity: roundStored(stream.kinematicViscosity),
    dynamicPressure: roundStored(stream.dynamicPressure),
    speed: roundStored(stream.speed),
    ...(stream.speedOfSound === undefined ? {} : { speedOfSound: roundStored(stream.speedOfSound) }),
  };
  const roundedTotals = {
    basic: roundStored(totals.basic),
    growth: roundStored(totals.growth),
    predicted: roundStored(totals.predicted),
    predictedWithoutSavings: roundStored(totals.predictedWithoutSavings),
    margin: roundStored(totals.margin),
    clearOfReserve: roundStored(totals.clearOfReserve),
  };
  return {
    operatingPoint,
    name,
    stream: roundedStream,
    limitHundredths,
    reserveHundredths,
    totals: roundedTotals,
    standing,
  };
}

const number = z.number();

const StoredTotalsText = z.object({
  worstPoint: z.string(),
  points: z.array(
    z.object({
      operatingPoint: z.string(),
      name: z.string(),
      stream: z.object({
        density: number,
        dynamicViscosity: number,
        kinematicViscosity: number,
        dynamicPressure: number,
        speed: number,
        speedOfSound: number.optional(),
      }),
      limitHundredths: z.int(),
      reserveHundredths: z.int(),
      totals: z.object({
        basic: number,
        growth: number,
        predicted: number,
        predictedWithoutSavings: number,
        margin: number,
        clearOfReserve: number,
      }),
      standing: z.enum(STANDING_ORDER),
    }),
  ),
});

// Written by ourselves from checked results and held by the hash: the shape is looked at, not every quantity.
const StoredNote = z.custom<Note>((value) => isRecord(value) && "code" in value && "severity" in value);
const StoredAnswer = z.custom<MethodAnswer>((value) => isRecord(value) && typeof value.drag === "number");
const StoredAnswerText = z.object({ answer: StoredAnswer.nullable(), refused: StoredNote.nullable() });

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null;
}

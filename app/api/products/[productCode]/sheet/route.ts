import { z } from "zod";

import { csvText } from "@/app/(workspace)/products/[productCode]/_export/csv-text";
import { sheetTable } from "@/app/(workspace)/products/[productCode]/_export/sheet-table";
import { xlsxFile } from "@/app/(workspace)/products/[productCode]/_export/xlsx-file";
import { budgetSheet, pointOf, sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { answerFile, type FileAnswer } from "@/app/_server/route-problem";
import { budgetAt } from "@/lib/budget/queries";
import { missingMeasureSentence } from "@/lib/evaluation/measures/measure-basis";
import { readingOf } from "@/lib/evaluation/measures/reading";
import type { Actor } from "@/lib/vocabulary/actor";
import { MEASURES, UNIT_SYSTEMS } from "@/lib/vocabulary/measures";
import { Refusal } from "@/lib/vocabulary/refusal";

const Question = z.object({
  format: z.enum(["csv", "xlsx"]),
  issue: z.coerce.number().int().positive().optional(),
  point: z.string().min(1).max(12).optional(),
  measure: z.enum(MEASURES).default("newtons"),
  units: z.enum(UNIT_SYSTEMS).default("si"),
});

/** The budget sheet at one operating point, for other programs. */
export async function GET(request: Request, { params }: RouteContext<"/api/products/[productCode]/sheet">) {
  const { productCode } = await params;
  const question = Question.safeParse(Object.fromEntries(new URL(request.url).searchParams));

  return answerFile((actor) => {
    if (!question.success)
      throw new Refusal("invalid", "Ask for the format csv or xlsx, of an issue and a point, in a measure.");
    return sheetFile(actor, productCode, question.data);
  });
}

async function sheetFile(
  actor: Actor,
  productCode: string,
  { format, issue, point: asked, measure, units }: z.output<typeof Question>,
): Promise<FileAnswer> {
  const budget = await budgetAt(actor, productCode, issue ?? "newest");
  const point = pointOf(budget, asked);
  if (!point) throw new Refusal("not_found", "That issue has no such operating point.");

  const sheet = budgetSheet(budget, point);
  const basis = sheetBasis(sheet);
  const reading = readingOf(measure, basis, units);
  if (!reading) throw new Refusal("invalid", missingMeasureSentence(measure, basis));
  const table = sheetTable(sheet, reading);
  const name = `${budget.product.code}-issue-${budget.issue.number}-${point.operatingPoint}.${format}`;
  if (format === "csv") return { name, type: "text/csv; charset=utf-8; header=present", body: csvText(table) };

  const type = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";
  return { name, type, body: new Uint8Array(await xlsxFile(table)) };
}

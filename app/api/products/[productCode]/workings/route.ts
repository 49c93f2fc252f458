import { z } from "zod";

import { readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import {
  type BudgetSheet,
  budgetSheet,
  pointOf,
  sheetBasis,
} from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { figureNewtons } from "@/app/(workspace)/products/[productCode]/_workings/figure-newtons";
import { figureWorking } from "@/app/(workspace)/products/[productCode]/_workings/figure-working";
import { readStep } from "@/app/(workspace)/products/[productCode]/_workings/read-step";
import { runWorking } from "@/app/(workspace)/products/[productCode]/_workings/run-working";
import { FIGURE_OWNERS, FIGURES, type Working } from "@/app/(workspace)/products/[productCode]/_workings/working";
import { answerRead } from "@/app/_server/route-problem";
import { lineHistory } from "@/lib/budget/line-history";
import { runsOf } from "@/lib/budget/monte-carlo/runs-of";
import { budgetAt } from "@/lib/budget/queries";
import { ALLOCATIONS_NUMBER } from "@/lib/evaluation/lines/allocations-body";
import type { Actor } from "@/lib/vocabulary/actor";
import { MEASURES, UNIT_SYSTEMS } from "@/lib/vocabulary/measures";
import { Refusal } from "@/lib/vocabulary/refusal";

const Question = z.object({
  issue: z.coerce.number().int().positive(),
  point: z.string().min(1).max(12),
  figure: z.enum(FIGURES),
  of: z.enum(FIGURE_OWNERS),
  number: z.string().min(1).max(80).nullable(),
  measure: z.enum(MEASURES).nullable(),
  units: z.enum(UNIT_SYSTEMS).nullable(),
});

/** How one number of a budget sheet came about. */
export async function GET(request: Request, { params }: RouteContext<"/api/products/[productCode]/workings">) {
  const { productCode } = await params;
  const asked = new URL(request.url).searchParams;
  const keys = ["issue", "point", "figure", "of", "number", "measure", "units"] as const;
  const question = Question.safeParse(Object.fromEntries(keys.map((key) => [key, asked.get(key)])));

  return answerRead((actor) => {
    if (!question.success) throw new Refusal("invalid", "This asks for no number of a sheet.");
    return workingFor(actor, productCode, question.data);
  });
}

async function workingFor(
  actor: Actor,
  productCode: string,
  { issue, point: operatingPoint, figure, of, number, measure, units }: z.output<typeof Question>,
): Promise<Working> {
  const budget = await budgetAt(actor, productCode, issue);
  const point = pointOf(budget, operatingPoint);
  if (!point) throw new Refusal("not_found", "That issue has no such operating point.");
  const revisions =
    figure === "allocation" ? await lineHistory(actor, productCode, "allocations", ALLOCATIONS_NUMBER) : [];
  const until = revisions.filter((revision) => revision.issue.number <= issue);
  const sheet = budgetSheet(budget, point);
  const working =
    of === "run" ? await workingOfRun(actor, sheet, number) : figureWorking(sheet, { figure, of, number }, until);
  if (!working) throw new Refusal("not_found", "The sheet has no such number.");

  const newtons = figureNewtons(sheet, { figure, of, number });
  const basis = sheetBasis(sheet);
  const reading = readingFor({ measure: measure ?? "newtons", units: units ?? "si" }, basis);
  const read = newtons === null ? null : readStep(reading, basis, newtons);
  return read ? { ...working, steps: [...working.steps, read] } : working;
}

async function workingOfRun(actor: Actor, sheet: BudgetSheet, number: string | null): Promise<Working | null> {
  const { budget, point } = sheet;
  const runs = await runsOf(actor, budget.product.code, budget.issue.number, point.operatingPoint);
  const run = runs.find(({ id }) => String(id) === number);
  return run ? runWorking(sheet, run) : null;
}

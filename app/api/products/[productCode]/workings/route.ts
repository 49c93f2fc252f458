import { z } from "zod";

import { type BudgetSheet, budgetSheet, pointOf } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { figureWorking } from "@/app/(workspace)/products/[productCode]/_workings/figure-working";
import { runWorking } from "@/app/(workspace)/products/[productCode]/_workings/run-working";
import { FIGURE_OWNERS, FIGURES, type Working } from "@/app/(workspace)/products/[productCode]/_workings/working";
import { answerRead } from "@/app/_server/route-problem";
import { lineHistory } from "@/lib/budget/line-history";
import { runsOf } from "@/lib/budget/monte-carlo/runs-of";
import { budgetAt } from "@/lib/budget/queries";
import { ALLOCATIONS_NUMBER } from "@/lib/evaluation/lines/allocations-body";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";

const Question = z.object({
  issue: z.coerce.number().int().positive(),
  point: z.string().min(1).max(12),
  figure: z.enum(FIGURES),
  of: z.enum(FIGURE_OWNERS),
  number: z.string().min(1).max(80).nullable(),
});

/** How one number of a budget sheet came about. */
export async function GET(request: Request, { params }: RouteContext<"/api/products/[productCode]/workings">) {
  const { productCode } = await params;
  const asked = new URL(request.url).searchParams;
  const keys = ["issue", "point", "figure", "of", "number"] as const;
  const question = Question.safeParse(Object.fromEntries(keys.map((key) => [key, asked.get(key)])));

  return answerRead((actor) => {
    if (!question.success) throw new Refusal("invalid", "This asks for no number of a sheet.");
    return workingFor(actor, productCode, question.data);
  });
}

async function workingFor(
  actor: Actor,
  productCode: string,
  { issue, point: operatingPoint, figure, of, number }: z.output<typeof Question>,
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

  return working;
}

async function workingOfRun(actor: Actor, sheet: BudgetSheet, number: string | null): Promise<Working | null> {
  const { budget, point } = sheet;
  const runs = await runsOf(actor, budget.product.code, budget.issue.number, point.operatingPoint);
  const run = runs.find(({ id }) => String(id) === number);
  return run ? runWorking(sheet, run) : null;
}

import { z } from "zod";

import { answerKept } from "@/app/_server/kept-answer";
import { keptSheet } from "@/lib/budget/kept-sheets";
import { Refusal } from "@/lib/vocabulary/refusal";

const Question = z.object({
  issue: z.coerce.number().int().positive(),
  point: z.string().min(1).max(12),
});

/** The data of a budget sheet: rows at one operating point of an issue, totals at the others. It never changes. */
export async function GET(request: Request, { params }: RouteContext<"/api/products/[productCode]/budget">) {
  const { productCode } = await params;
  const question = Question.safeParse(Object.fromEntries(new URL(request.url).searchParams));

  return answerKept(request, (actor, known) => {
    if (!question.success) throw new Refusal("invalid", "Ask for an issue and an operating point of it.");
    const { issue, point } = question.data;
    return keptSheet(actor, { productCode, issue, operatingPoint: point }, known);
  });
}

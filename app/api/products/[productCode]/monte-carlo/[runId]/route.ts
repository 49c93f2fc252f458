import { z } from "zod";

import { answerStreamed } from "@/app/_server/streamed-answer";
import { repeatRun } from "@/lib/budget/monte-carlo/repeat-run";
import { Refusal } from "@/lib/vocabulary/refusal";

const RunId = z.coerce.number().int().positive();

/** Draws a kept run again, tells the progress line by line, and says whether the same came out. */
export async function POST(
  request: Request,
  { params }: RouteContext<"/api/products/[productCode]/monte-carlo/[runId]">,
) {
  const { productCode, runId } = await params;
  return answerStreamed(request, z.strictObject({}), async (actor, _nothing, _clock, watch) => {
    const id = RunId.safeParse(runId);
    if (!id.success) throw new Refusal("not_found", "There is no such run of this budget.");

    return repeatRun(actor, productCode, id.data, watch);
  });
}

import { answerStreamed } from "@/app/_server/streamed-answer";
import { drawAndKeep } from "@/lib/budget/monte-carlo/draw-and-keep";
import { DrawIssueInput } from "@/lib/budget/monte-carlo/draw-issue";

const RunInput = DrawIssueInput.omit({ productCode: true });

/** Draws an issue at an operating point, tells the progress line by line, and keeps what came out. */
export async function POST(request: Request, { params }: RouteContext<"/api/products/[productCode]/monte-carlo">) {
  const { productCode } = await params;
  return answerStreamed(request, RunInput, (actor, input, clock, watch) =>
    drawAndKeep(actor, { ...input, productCode }, clock, watch),
  );
}

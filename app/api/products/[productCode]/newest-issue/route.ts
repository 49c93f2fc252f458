import { answerRead } from "@/app/_server/route-problem";
import { productFactsFor } from "@/lib/budget/queries";

/** The number of the newest issue, for a page that wants to know whether it still shows it. */
export async function GET(_request: Request, { params }: RouteContext<"/api/products/[productCode]/newest-issue">) {
  const { productCode } = await params;
  return answerRead(async (actor) => ({ issue: (await productFactsFor(actor, productCode)).newestIssue }));
}

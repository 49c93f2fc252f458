import { trialTargets } from "@/app/(workspace)/trial/_server/trial-targets";
import { answerRead } from "@/app/_server/route-problem";

/** What the signed-in person may make of a trial in this product. */
export async function GET(_request: Request, { params }: RouteContext<"/api/products/[productCode]/trial-targets">) {
  const { productCode } = await params;
  return answerRead((actor) => trialTargets(actor, productCode));
}

import { answerFile } from "@/app/_server/route-problem";
import { exportedHistory } from "@/lib/budget/product-history";

/** The chain of a product as it is stored, one JSON object to a line: enough to check it elsewhere. */
export async function GET(_request: Request, { params }: RouteContext<"/api/products/[productCode]/history">) {
  const { productCode } = await params;

  return answerFile(async (actor) => ({
    name: `${productCode}-history.jsonl`,
    type: "application/jsonl; charset=utf-8",
    body: (await exportedHistory(actor, productCode)).map((entry) => `${JSON.stringify(entry)}\n`).join(""),
  }));
}

import { refusalResponse } from "@/app/_server/route-problem";
import { currentActor } from "@/app/_server/session";
import { exportedHistory } from "@/lib/budget/product-history";
import { Refusal } from "@/lib/vocabulary/refusal";

/** The chain of a product as it is stored, one JSON object to a line: enough to check it elsewhere. */
export async function GET(_request: Request, { params }: RouteContext<"/api/products/[productCode]/history">) {
  const { productCode } = await params;
  const actor = await currentActor();
  if (!actor)
    return Response.json(
      { code: "forbidden", sentence: "You are signed out. Sign in again.", faults: [] },
      { status: 401 },
    );

  try {
    const entries = await exportedHistory(actor, productCode);
    return new Response(entries.map((entry) => `${JSON.stringify(entry)}\n`).join(""), {
      headers: {
        "content-type": "application/jsonl; charset=utf-8",
        "content-disposition": `attachment; filename="${productCode}-history.jsonl"`,
        "cache-control": "no-store",
      },
    });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    throw error;
  }
}

import { currentActor } from "@/app/_server/session";
import { refusalResponse } from "@/app/_server/route-problem";
import { proposalPatch } from "@/lib/proposals/queries";
import { Refusal } from "@/lib/vocabulary/refusal";

type Context = RouteContext<"/products/[productCode]/proposals/[proposalKey]/patch">;

/** The change as a patch over the canonical text of its lines. */
export async function GET(_request: Request, { params }: Context): Promise<Response> {
  const { productCode, proposalKey } = await params;
  const actor = await currentActor();
  if (!actor) return new Response("Sign in first.\n", { status: 401 });
  try {
    const patch = await proposalPatch(actor, productCode, proposalKey);
    if (!patch) return new Response("There is no such proposal.\n", { status: 404 });

    return new Response(patch.text, {
      headers: {
        "content-type": "text/x-diff; charset=utf-8",
        "content-disposition": `attachment; filename="${patch.label.replaceAll(" ", "-")}.patch"`,
        "x-content-type-options": "nosniff",
        "cache-control": "no-store",
      },
    });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    throw error;
  }
}

import { invalid } from "@/app/_server/define-action";
import { isForeignWrite } from "@/app/_server/request-limits";
import { refusalResponse, signedOut } from "@/app/_server/route-problem";
import { NO_CONTENT_POLICY, securityHeaders } from "@/app/_server/security-headers";
import { currentActor } from "@/app/_server/session";
import { tooLarge } from "@/lib/evidence/receive-file";
import { addFile } from "@/lib/proposals/files/add-file";
import { AddFileInput } from "@/lib/proposals/schema";
import { LONGEST_FILE } from "@/lib/vocabulary/files";
import { Refusal } from "@/lib/vocabulary/refusal";

type Context = RouteContext<"/api/products/[productCode]/files">;

/**
 * Takes a file as the body of the request, as it comes. The proxy does not stand before this one route, since it would
 * hold the body and cut it: what the proxy does for all others is done here.
 */
export async function POST(request: Request, { params }: Context): Promise<Response> {
  const response = await answer(request, (await params).productCode);
  for (const [name, value] of Object.entries(securityHeaders(NO_CONTENT_POLICY))) response.headers.set(name, value);

  return response;
}

async function answer(request: Request, productCode: string): Promise<Response> {
  if (isForeignWrite(request)) {
    return refusalResponse(new Refusal("forbidden", "This did not come from a page of ours."));
  }
  const actor = await currentActor();
  if (!actor) return signedOut();

  const asked = new URL(request.url).searchParams;
  const input = AddFileInput.safeParse({
    productCode,
    proposalId: Number(asked.get("proposal")),
    place: asked.get("place"),
    name: asked.get("name"),
    sourceDate: asked.get("sourceDate"),
  });
  if (!input.success) return refusalResponse(invalid(input.error));
  // Saves the sending of what is too long anyway; what it says less than it sends is counted as it comes.
  if (Number(request.headers.get("content-length")) > LONGEST_FILE) return refusalResponse(tooLarge());

  try {
    const added = await addFile(actor, input.data, bytesOf(request));
    return Response.json(added, { headers: { "cache-control": "no-store" } });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    // Nobody is there any more to be answered, and nothing of it was kept.
    if (request.signal.aborted) return refusalResponse(new Refusal("invalid", "The file did not arrive whole."));
    throw error;
  }
}

async function* bytesOf({ body }: Request): AsyncGenerator<Uint8Array> {
  if (!body) return;
  const reader = body.getReader();
  try {
    for (let part = await reader.read(); !part.done; part = await reader.read()) yield part.value;
  } finally {
    await reader.cancel().catch(() => undefined);
  }
}

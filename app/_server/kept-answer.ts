import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";

import { refusalResponse, signedOut } from "./route-problem";
import { currentActor } from "./session";

interface KeptText {
  /** Of the text, before it was compressed. */
  sha256: string;
  /** Compressed; null where the reader has it. */
  bytes: Buffer<ArrayBuffer> | null;
}

/**
 * Answers a read of what never changes: whoever has it is told so, once it is certain that they may still read it. The
 * bytes go out as they are kept, as a gzip file: the server takes a content coding of ours off.
 *
 * @param read gets the SHA-256 of what the reader has
 */
export async function answerKept(
  request: Request,
  read: (actor: Actor, known: string | null) => Promise<KeptText>,
): Promise<Response> {
  const actor = await currentActor();
  if (!actor) return signedOut();

  try {
    const { sha256, bytes } = await read(actor, knownHash(request));
    // Kept by the browser of this person, asked about each time: a role may have ended.
    const headers = { etag: `"${sha256}"`, "cache-control": "private, no-cache, no-transform", vary: "cookie" };
    if (bytes === null) return new Response(null, { status: 304, headers });

    return new Response(new Uint8Array(bytes), { headers: { ...headers, "content-type": "application/gzip" } });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    throw error;
  }
}

/** Of the tags that the reader names the one that may be ours; what else stands there is nothing of ours. */
function knownHash(request: Request): string | null {
  const named = request.headers.get("if-none-match") ?? "";
  return [...named.matchAll(/(?<!W\/)"([0-9a-f]{64})"/g)].map(([, hash]) => hash ?? "").at(-1) ?? null;
}

import { type NextRequest, NextResponse } from "next/server";

import { contentSecurityPolicy } from "@/app/_server/content-security-policy";
import { bodyTooLong, isForeignWrite } from "@/app/_server/request-limits";
import { DOWNLOAD_POLICY, isDownload, NO_CONTENT_POLICY, securityHeaders } from "@/app/_server/security-headers";

/** Stands before every page and route: refuses what no page of ours sends, and gives each answer its nonce. */
export function proxy(request: NextRequest): NextResponse {
  if (isForeignWrite(request)) return refusal(403, "This request did not come from a page of this address.");
  if (bodyTooLong(request)) return refusal(413, "This is longer than one megabyte. Shorten it and send it again.");

  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const policy = isDownload(request.nextUrl.pathname)
    ? DOWNLOAD_POLICY
    : contentSecurityPolicy(nonce, process.env.NODE_ENV === "development");
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  // Where a sign-in leads back to.
  headers.set("x-path", `${request.nextUrl.pathname}${request.nextUrl.search}`);
  headers.set("content-security-policy", policy);

  return harden(NextResponse.next({ request: { headers } }), policy);
}

/** All but what is fixed, and files on their way in: here a body is cut, while their own route counts it as it comes. */
export const config = {
  matcher: ["/((?!_next/static|_next/image|favicon.ico|icon.svg|api/products/[^/]+/files$).*)"],
};

function refusal(status: number, sentence: string): NextResponse {
  return harden(NextResponse.json({ code: "invalid", sentence, faults: [] }, { status }), NO_CONTENT_POLICY);
}

function harden(response: NextResponse, policy: string): NextResponse {
  for (const [name, value] of Object.entries(securityHeaders(policy))) response.headers.set(name, value);

  return response;
}

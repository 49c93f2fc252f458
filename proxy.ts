import { type NextRequest, NextResponse } from "next/server";

import { contentSecurityPolicy } from "@/app/_server/content-security-policy";
import { bodyTooLong, isForeignWrite } from "@/app/_server/request-limits";

/** Stands before every page and route: refuses what no page of ours sends, and gives each answer its nonce. */
export function proxy(request: NextRequest): NextResponse {
  if (isForeignWrite(request)) return refusal(403, "This request did not come from a page of this address.");
  if (bodyTooLong(request)) return refusal(413, "This is longer than one megabyte. Shorten it and send it again.");

  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const policy = contentSecurityPolicy(nonce, process.env.NODE_ENV === "development");
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  // Where a sign-in leads back to.
  headers.set("x-path", `${request.nextUrl.pathname}${request.nextUrl.search}`);
  headers.set("content-security-policy", policy);

  return harden(NextResponse.next({ request: { headers } }), policy);
}

export const config = { matcher: ["/((?!_next/static|_next/image|favicon.ico|icon.svg).*)"] };

function refusal(status: number, sentence: string): NextResponse {
  const policy = "default-src 'none'; frame-ancestors 'none'";

  return harden(NextResponse.json({ code: "invalid", sentence, faults: [] }, { status }), policy);
}

function harden(response: NextResponse, policy: string): NextResponse {
  response.headers.set("content-security-policy", policy);
  // "no-referrer" would make a browser send "Origin: null" with forms, which are then refused.
  response.headers.set("referrer-policy", "same-origin");
  response.headers.set("x-content-type-options", "nosniff");
  response.headers.set("x-frame-options", "DENY");
  response.headers.set("cross-origin-opener-policy", "same-origin");
  response.headers.set("permissions-policy", "camera=(), microphone=(), geolocation=()");

  return response;
}

import { NextRequest } from "next/server";
import { describe, expect, it } from "vitest";

import { contentSecurityPolicy } from "@/app/_server/content-security-policy";
import { proxy } from "@/proxy";

const ADDRESS = "http://127.0.0.1:4000/products";

function directives(policy: string | null): Map<string, string> {
  const parts = (policy ?? "").split("; ").map((part): [string, string] => {
    const space = part.indexOf(" ");
    return [part.slice(0, space), part.slice(space + 1)];
  });
  return new Map(parts);
}

describe("the content policy of an answer", () => {
  it("lets only scripts with the answer's own nonce run", () => {
    const policy = directives(contentSecurityPolicy("abc", false));

    expect(policy.get("script-src")).toBe("'self' 'nonce-abc' 'strict-dynamic'");
    expect(policy.get("style-src-elem")).toBe("'self' 'nonce-abc'");
    expect(policy.get("style-src-attr")).toBe("'unsafe-inline'");
  });

  it("forbids frames, plugins, another base and forms that go elsewhere", () => {
    const policy = directives(contentSecurityPolicy("abc", false));

    expect(policy.get("frame-ancestors")).toBe("'none'");
    expect(policy.get("object-src")).toBe("'none'");
    expect(policy.get("base-uri")).toBe("'none'");
    expect(policy.get("form-action")).toBe("'self'");
    expect(policy.get("img-src")).toBe("'self' data:");
  });

  it("allows eval while developing and never in a build", () => {
    expect(contentSecurityPolicy("abc", true)).toContain("'unsafe-eval'");
    expect(contentSecurityPolicy("abc", false)).not.toContain("unsafe-eval");
  });
});

describe("what stands before every page", () => {
  it("gives every answer another nonce and tells it to the page", () => {
    const one = proxy(new NextRequest(ADDRESS));
    const other = proxy(new NextRequest(ADDRESS));
    const nonce = one.headers.get("x-middleware-request-x-nonce");

    expect(nonce).toMatch(/^[A-Za-z0-9+/]{22}==$/);
    expect(one.headers.get("content-security-policy")).toContain(`'nonce-${nonce}'`);
    expect(other.headers.get("x-middleware-request-x-nonce")).not.toBe(nonce);
  });

  it("sends the headers that keep the page to itself", () => {
    const { headers } = proxy(new NextRequest(ADDRESS));

    expect(headers.get("referrer-policy")).toBe("same-origin");
    expect(headers.get("x-content-type-options")).toBe("nosniff");
  });

  it("replaces a nonce that the request brought along", () => {
    const request = new NextRequest(ADDRESS, { headers: { "x-nonce": "mine" } });

    expect(proxy(request).headers.get("x-middleware-request-x-nonce")).not.toBe("mine");
  });

  it("refuses a write from another site", async () => {
    const headers = { host: "127.0.0.1:4000", origin: "https://elsewhere.example" };
    const answer = proxy(new NextRequest(ADDRESS, { method: "POST", headers }));

    expect(answer.status).toBe(403);
    expect(await answer.json()).toMatchObject({ sentence: "This request did not come from a page of this address." });
  });

  it("refuses a write whose origin is hidden", () => {
    const headers = { host: "127.0.0.1:4000", origin: "null" };

    expect(proxy(new NextRequest(ADDRESS, { method: "POST", headers })).status).toBe(403);
  });

  it("refuses a write that a browser calls cross-site though its origin is missing", () => {
    const headers = { host: "127.0.0.1:4000", "sec-fetch-site": "cross-site" };

    expect(proxy(new NextRequest(ADDRESS, { method: "POST", headers })).status).toBe(403);
  });

  it("lets a write of its own pages through", () => {
    const headers = { host: "127.0.0.1:4000", origin: "http://127.0.0.1:4000", "sec-fetch-site": "same-origin" };

    expect(proxy(new NextRequest(ADDRESS, { method: "POST", headers })).status).toBe(200);
  });

  it("refuses a body of more than a megabyte and one that does not say how long it is", () => {
    const host = { host: "127.0.0.1:4000" };
    const long = new NextRequest(ADDRESS, { method: "POST", headers: { ...host, "content-length": "1048577" } });
    const unsaid = new NextRequest(ADDRESS, { method: "POST", headers: { ...host, "transfer-encoding": "chunked" } });

    expect(proxy(long).status).toBe(413);
    expect(proxy(unsaid).status).toBe(413);
  });
});

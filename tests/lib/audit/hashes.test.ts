import canonicalize from "canonicalize";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { canonicalJson } from "@/lib/audit/canonical-json";
import { entryHash, GENESIS_HASH } from "@/lib/audit/entry-hash";
import { issueContentHash, type IssueContent } from "@/lib/audit/issue-content-hash";
import { lineRevisionHash, type HashedRevision } from "@/lib/audit/line-revision-hash";
import { textHash } from "@/lib/audit/text-hash";

/** SHA-256 by another implementation than the one in use. */
async function webSha256(text: string): Promise<string> {
  const digest = await crypto.subtle.digest("SHA-256", new TextEncoder().encode(text));
  return Buffer.from(digest).toString("hex");
}

describe("canonical JSON", () => {
  it("gives the example of RFC 8785, section 3.2.4", () => {
    const value = {
      numbers: [333333333.33333329, 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"/",
      literals: [null, true, false],
    };
    expect(canonicalJson(value)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  it("orders members by UTF-16 code units as RFC 8785, section 3.2.3", () => {
    const members = { "\u20ac": 1, "\r": 2, "\ufb33": 3, "1": 4, "\u{1f600}": 5, "\u0080": 6, "\u00f6": 7 };
    expect(Object.values(JSON.parse(canonicalJson(members)))).toHaveLength(7);
    const order = [...canonicalJson(members).matchAll(/:(\d)/g)].map(([, digit]) => digit);
    expect(order).toEqual(["2", "4", "6", "7", "1", "5", "3"]);
  });

  it("agrees with another implementation on whatever JSON can hold", () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => canonicalJson(value) === canonicalize(value)));
  });

  it.each([NaN, Infinity, "\ud800", { "\udc00": 1 }, undefined, [undefined], new Date(0), new Map(), 1n])(
    "refuses %s",
    (value) => {
      expect(() => canonicalJson(value)).toThrow();
    },
  );
});

describe("an entry's hash", () => {
  it("is SHA-256 over recipe, predecessor and text", async () => {
    const text = '{"act":"propose"}';
    expect(entryHash(GENESIS_HASH, text)).toBe(await webSha256(`leeboard-history/1\n${"0".repeat(64)}\n${text}`));
  });

  it("moves with each of its ingredients", () => {
    expect(entryHash("a", "text")).not.toBe(entryHash("b", "text"));
    expect(entryHash("a", "text")).not.toBe(entryHash("a", "texts"));
  });
});

it("hashes a text of one kind otherwise than of another", async () => {
  expect(textHash("round", "x")).toBe(await webSha256("leeboard-round/1\nx"));
  expect(textHash("round", "x")).not.toBe(textHash("signature", "x"));
});

describe("a revision's hash", () => {
  const revision: HashedRevision = {
    ...{ productCode: "TF2", kind: "item", number: "010", letter: "A", retired: false, body: '{"name":"Roof"}' },
  };

  it.each([
    { productCode: "GS4" },
    { kind: "group" },
    { number: "020" },
    { letter: "B" },
    { retired: true },
    { body: "{}" },
  ] satisfies Partial<HashedRevision>[])("moves with %o", (change) => {
    expect(lineRevisionHash({ ...revision, ...change })).not.toBe(lineRevisionHash(revision));
  });
});

describe("an issue's content hash", () => {
  const result = { item: "010", operatingPoint: "OP-1", methodVersion: 1, notes: "[]", answer: "{}" };
  const numbers = { basic: 1, growthFraction: 0.2, growth: 0.2, predicted: 1.2 };
  const revision = { kind: "item", number: "010", letter: "A", hash: "h" } as const;
  const content: IssueContent = {
    ...{ productCode: "TF2", number: 2, totals: "[]", uncertainty: null },
    revisions: [revision, { ...revision, number: "020" }],
    results: [
      { ...result, ...numbers },
      { ...result, ...numbers, item: "020" },
    ],
  };

  it("does not depend on the order of rows", () => {
    const turned = { ...content, revisions: content.revisions.toReversed(), results: content.results.toReversed() };
    expect(issueContentHash(turned)).toBe(issueContentHash(content));
  });

  it.each<[string, Partial<IssueContent>]>([
    ["number", { number: 3 }],
    ["product", { productCode: "GS4" }],
    ["totals", { totals: "[1]" }],
    ["uncertainty", { uncertainty: "{}" }],
    ["a revision", { revisions: content.revisions.slice(1) }],
    ["a revision's hash", { revisions: content.revisions.map((row) => ({ ...row, hash: "i" })) }],
    ["a revision's letter", { revisions: content.revisions.map((row) => ({ ...row, letter: "B" })) }],
    ["a result", { results: content.results.slice(1) }],
    ["basic", { results: content.results.map((row) => ({ ...row, basic: 2 })) }],
    ["growth fraction", { results: content.results.map((row) => ({ ...row, growthFraction: 0.1 })) }],
    ["growth", { results: content.results.map((row) => ({ ...row, growth: 0.1 })) }],
    ["predicted", { results: content.results.map((row) => ({ ...row, predicted: 2 })) }],
    ["method version", { results: content.results.map((row) => ({ ...row, methodVersion: 2 })) }],
    ["notes", { results: content.results.map((row) => ({ ...row, notes: "[1]" })) }],
    ["answer", { results: content.results.map((row) => ({ ...row, answer: "[1]" })) }],
    ["operating point", { results: content.results.map((row) => ({ ...row, operatingPoint: "OP-2" })) }],
  ])("moves with %s", (_, change) => {
    expect(issueContentHash({ ...content, ...change })).not.toBe(issueContentHash(content));
  });
});

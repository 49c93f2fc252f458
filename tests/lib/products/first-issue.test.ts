import { describe, expect, it } from "vitest";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { Refusal } from "@/lib/vocabulary/refusal";
import { firstIssueLines } from "@/lib/products/first-issue";
import { EstablishProductInput } from "@/lib/products/schema";

const POINT = {
  ...newOperatingPoint(),
  name: "Motorway, 90 km/h",
  speed: { value: 25, entered: "90 km/h" },
  limitHundredths: 6600,
};
const TERMS = newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 300 });

const input = (point: object = {}, terms: object = {}) =>
  EstablishProductInput.parse({
    productCode: "TF-2",
    operatingPoint: { number: "OP-1", body: { ...POINT, ...point } },
    terms: { ...TERMS, ...terms },
    password: "correct horse",
  });

function faultsOf(run: () => unknown): string[] {
  try {
    run();
  } catch (refusal) {
    if (refusal instanceof Refusal) return refusal.faults.map(({ path }) => path);
    throw refusal;
  }
  return [];
}

describe("the lines of issue 1", () => {
  const lines = firstIssueLines("vehicle_fairing", input());

  it("are the reference operating point, the terms, the allocations sheet and finishes, at their first letter", () => {
    expect(new Set(lines.map(({ kind }) => kind))).toEqual(
      new Set(["operating_point", "terms", "allocations", "finish"]),
    );
    expect(lines.every(({ letter, issue, retired }) => letter === "–" && issue === 1 && !retired)).toBe(true);
    expect(new Set(lines.map(({ kind, number }) => `${kind} ${number}`)).size).toBe(lines.length);
  });

  it("leave unallocated what the reserve leaves of the limit", () => {
    const sheet = lines.find(({ kind }) => kind === "allocations");
    expect(sheet?.body).toEqual({ rows: [], unallocatedHundredths: 6300 });
  });

  it("name a source for every finish of the catalogue", () => {
    const finishes = lines.flatMap((line) => (line.kind === "finish" ? [line.body] : []));
    expect(finishes.length).toBeGreaterThan(5);
    for (const { roughness, source } of finishes) {
      expect(roughness.value).toBeGreaterThan(0);
      expect(source).toMatch(/from memory|general duct tables|judgement/i);
    }
  });
});

describe("what establishing refuses, each at its field", () => {
  const refused = (point: object, terms: object = {}) =>
    faultsOf(() => firstIssueLines("vehicle_fairing", input(point, terms)));

  it("a reference operating point without limit, or without speed", () => {
    expect(refused({ limitHundredths: null })).toEqual(["operatingPoint.body.limitHundredths"]);
    expect(refused({ speed: null })).toEqual(["operatingPoint.body.speed"]);
  });

  it("a reserve beyond the limit, and one at a point that does not exist", () => {
    const reserves = (...rows: object[]) => ({ reserves: rows });
    expect(refused({}, reserves({ operatingPoint: "OP-1", hundredths: 6601 }))).toEqual(["terms.reserves"]);
    const elsewhere = { operatingPoint: "OP-9", hundredths: 0 };
    expect(refused({}, reserves({ operatingPoint: "OP-1", hundredths: 0 }, elsewhere))).toEqual(["terms.reserves"]);
  });

  it("terms that name another reference operating point", () => {
    const terms = newTerms({ referenceOperatingPoint: "OP-2", reserveHundredths: 0 });
    expect(refused({}, terms)).toContain("terms.referenceOperatingPoint");
  });

  it("a duct without flow area", () => {
    expect(faultsOf(() => firstIssueLines("duct", input()))).toEqual(["terms.flowArea"]);
    expect(faultsOf(() => firstIssueLines("duct", input({}, { flowArea: { value: 3 } })))).toEqual([]);
  });

  it("faults of both bodies at once", () => {
    expect(refused({ speed: null }, { countSize: 0.5 })).toEqual(["operatingPoint.body.speed", "terms.countSize"]);
  });
});

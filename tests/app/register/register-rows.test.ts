import { describe, expect, it } from "vitest";
import {
  chosenProducts,
  registerAddress,
  RegisterQuery,
  type RegisterRow,
} from "@/app/(workspace)/products/_register/register-rows";
import { sparkLayout } from "@/app/(workspace)/products/_register/spark-layout";
import type { Standing } from "@/lib/vocabulary/standing";

function row(
  code: string,
  margin: number | null,
  standing: Standing,
  waiting = 0,
  openProposals = waiting,
): RegisterRow {
  const product = { id: 1, code, name: `Fairing ${code}`, kind: "vehicle_fairing", timeZone: "UTC" } as const;
  const worst =
    margin === null
      ? null
      : { operatingPoint: "OP-1", name: "", predicted: 100 - margin, limit: 100, reserve: 5, margin, standing };
  return {
    product: { ...product, newestIssue: worst && 3 },
    roles: [],
    worst,
    openProposals,
    trend: [],
    waiting,
  };
}

const ROWS = [
  row("C3", null, "inside"),
  row("B2", -1, "over", 2, 4),
  row("A1", 3, "into_the_reserve", 0, 1),
  row("D4", 20, "inside"),
];
const codes = (query: Partial<RegisterQuery>) =>
  chosenProducts(ROWS, { ...RegisterQuery.parse({}), ...query }).map(({ product }) => product.code);

describe("the register", () => {
  it("stands by code, and by what is asked for", () => {
    expect(codes({})).toEqual(["A1", "B2", "C3", "D4"]);
    expect(codes({ sort: "margin" })).toEqual(["B2", "A1", "D4", "C3"]);
    expect(codes({ sort: "standing" })).toEqual(["B2", "A1", "D4", "C3"]);
    expect(codes({ sort: "pending" })).toEqual(["B2", "A1", "C3", "D4"]);
    expect(codes({ sort: "code", down: "1" })).toEqual(["D4", "C3", "B2", "A1"]);
  });

  it("shows what waits, what is open, what stands badly, what is not established, what is found", () => {
    expect(codes({ only: "waiting" })).toEqual(["B2"]);
    expect(codes({ only: "open" })).toEqual(["A1", "B2"]);
    expect(codes({ only: "over" })).toEqual(["B2"]);
    expect(codes({ only: "into_the_reserve" })).toEqual(["A1"]);
    expect(codes({ only: "not_established" })).toEqual(["C3"]);
    expect(codes({ find: "fairing d4" })).toEqual(["D4"]);
    expect(codes({ find: "nothing" })).toEqual([]);
  });

  it("keeps the question in the address, and reads nonsense as if it were not there", () => {
    const query = RegisterQuery.parse({ sort: "sideways", only: "over", find: " A " });
    expect(query).toMatchObject({ sort: "code", only: "over", find: "A" });
    expect(registerAddress(query, { measure: "counts", sort: "margin" })).toBe(
      "/products?measure=counts&find=A&only=over&sort=margin",
    );
    expect(registerAddress(RegisterQuery.parse({}), {})).toBe("/products");
  });
});

describe("a spark line", () => {
  it("steps at each issue, with the greatest value at its top and the least at its foot", () => {
    const { predicted, limit } = sparkLayout([
      { predicted: 0, limit: 100 },
      { predicted: 50, limit: 100 },
    ]);
    expect(predicted).toEqual([
      { x: 0, y: 1 },
      { x: 0.5, y: 1 },
      { x: 0.5, y: 0.5 },
      { x: 1, y: 0.5 },
    ]);
    expect(limit.map(({ y }) => y)).toEqual([0, 0, 0, 0]);
  });

  it("stays in its picture where nothing moves", () => {
    const { predicted } = sparkLayout([{ predicted: 7, limit: 7 }]);
    expect(predicted.every(({ y }) => y >= 0 && y <= 1)).toBe(true);
  });
});

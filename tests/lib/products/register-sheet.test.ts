import { describe, expect, it } from "vitest";
import { registerSheet } from "@/lib/products/register-sheet";
import { waitingByProduct } from "@/lib/proposals/day-sheet/waiting-by-product";
import { withDatabase } from "@/tests/support/database";
import { person, product, withRole } from "@/tests/support/people";
import { cast, close, Q, threeIssues } from "@/tests/support/three-issues";

withDatabase();

describe("the register of products", () => {
  it("tells the trend at the worst point with what its forces are referred to", async () => {
    const people = await cast();
    await threeIssues(people);
    const [entry] = await registerSheet(people.ines);

    expect(entry?.worst).toMatchObject({ operatingPoint: "OP-1", limit: 100, reserve: 10, standing: "inside" });
    expect(entry?.trend.map(({ issue, predicted, limit }) => [issue, predicted, limit])).toEqual([
      [1, 0, 100],
      [2, close(Q * 0.11 * 1.2), 100],
      [3, close(Q * (0.08 * 1.15 + 0.008 * 1.2)), 100],
    ]);
    expect(entry?.trend.at(-1)?.basis).toMatchObject({ dynamicPressure: close(Q), speed: 25, countSize: 0.001 });
  });

  it("shows no figure of a product that is not established, and nothing of one in which one holds no role", async () => {
    const { ines, ...people } = await cast();
    await product("ZZ-9");
    expect(await registerSheet(ines)).toMatchObject([{ product: { code: "TF-2" }, worst: null, trend: [] }]);
    const both = await withRole(people.lusia, "ZZ-9", "auditor");
    expect((await registerSheet(both)).map(({ product: { code } }) => code)).toEqual(["TF-2", "ZZ-9"]);
    expect(await registerSheet(await person("Nobody Here"))).toEqual([]);
  });

  it("counts what waits for the reader, product by product", async () => {
    const people = await cast();
    await threeIssues(people);
    expect([...(await waitingByProduct(people.ines))]).toEqual([["TF-2", 0]]);
  });
});

import { describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { budgetAt } from "@/lib/budget/queries";
import { recomputeIssue } from "@/lib/budget/recompute-issue";
import { uncertaintyAt } from "@/lib/budget/uncertainty-at";
import { OWN_UNCERTAINTIES } from "@/lib/evaluation/methods/own-uncertainties";
import { inSnapshot } from "@/models/database";
import { addItem, approve, bluffItem, establish, fixedItem } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { forge } from "@/tests/support/forge";
import { person, product, withRole } from "@/tests/support/people";
import { expectRelative } from "@/tests/support/relative";

withDatabase();

/** Ideal gas at 15 °C and 101 325 Pa (ISO 2533), q = ½ρU² at 25 m/s, Pa. */
const Q = 0.5 * (101325 / (287.05287 * 288.15)) * 25 ** 2;

async function mirrorAndLamp() {
  await product("TF-2");
  const tansy = await withRole(await person("Tansy Merle"), "TF-2", "component_owner");
  const ines = await withRole(await person("Ines Maat"), "TF-2", "reviewer");
  const lusia = await withRole(await person("Lusia Brand"), "TF-2", "program_manager");
  await establish(lusia, "TF-2", "2026-03-01T09:00:00.000Z", { limit: 5000 });
  await approve("TF-2", "2026-03-10T09:00:00.000Z", {
    proposer: tansy,
    signers: [
      [ines, "reviewer"],
      [lusia, "program_manager"],
    ],
    edits: [
      addItem("010", bluffItem(tansy.userId, 0.5, 0.2, { coefficientUncertainty: 0.02 })),
      addItem("020", fixedItem(tansy.userId, 3, { force: { value: 3, standardUncertainty: 0.4 } })),
    ],
  });
  return { ines, lusia };
}

describe("the uncertainty of an issue", () => {
  it("is frozen with it at every operating point", async () => {
    const { ines } = await mirrorAndLamp();
    const stored = await uncertaintyAt(ines, "TF-2", "newest");
    const [point] = stored?.points ?? [];
    if (!point || "refused" in point) throw new Error("no uncertainty at the point");

    const mirror = 0.5 * 0.2 * Q;
    const u = Math.hypot(0.02 * 0.2 * Q, OWN_UNCERTAINTIES["bluff-body"].relative * mirror, 0.4);
    expectRelative(point.basic.value, mirror + 3, 1e-9);
    expectRelative(point.basic.standardUncertainty, u, 1e-8);
    expectRelative(point.predicted.standardUncertainty, 1.2 * u, 1e-8);
    expect(point.causes.map(({ key }) => key).sort()).toEqual([
      "item:010:dragCoefficient",
      "item:020:force",
      "method:bluff-body",
    ]);
  });

  it("stays what it was at an earlier issue: the first has nothing that could be uncertain", async () => {
    const { lusia } = await mirrorAndLamp();
    const first = await uncertaintyAt(lusia, "TF-2", 1);
    expect(first?.points).toMatchObject([{ operatingPoint: "OP-1", basic: { value: 0, standardUncertainty: 0 } }]);
  });

  it("is held by the issue's hash", async () => {
    await mirrorAndLamp();
    expect((await verifyChain("TF-2")).faults).toEqual([]);
    await forge("UPDATE issues SET uncertainty = json_set(uncertainty, '$.points[0].basicExceedsLimit', 0.5)");
    const found = (await verifyChain("TF-2")).faults.filter(({ code }) => code === "content");
    expect(found.map(({ where }) => where)).toEqual(["issue 1", "issue 2"]);
  });

  it("comes out again when its issue is recomputed, and a number that was altered is told", async () => {
    const { ines } = await mirrorAndLamp();
    const { product: read } = await budgetAt(ines, "TF-2", "newest");
    const recomputed = () => inSnapshot((tx) => recomputeIssue(read.id, 2, tx));
    expect(await recomputed()).toEqual([]);

    const altered = (path: string, sql: string) =>
      forge(`UPDATE issues SET uncertainty = json_set(uncertainty, '${path}', ${sql}) WHERE number = 2`);
    await altered("$.points[0].basic.low95", "json_extract(uncertainty, '$.points[0].basic.low95') + 1e-6");
    await altered("$.points[0].predictedExceedsLimit", "0.5");
    expect((await recomputed()).map(({ quantity }) => quantity)).toEqual([
      "uncertainty.basic.low95",
      "uncertainty.predictedExceedsLimit",
    ]);
    await altered("$.points[0].causes[0].key", "'item:010:other'");
    expect((await recomputed()).map(({ quantity }) => quantity)).toContain("uncertainty.item:010:other.share");
  });

  it("is read by members only", async () => {
    await mirrorAndLamp();
    const stranger = await person("Otto Veer");
    await expect(uncertaintyAt(stranger, "TF-2", "newest")).rejects.toMatchObject({ code: "forbidden" });
  });

  it("is refused for an issue that is not there", async () => {
    const { ines } = await mirrorAndLamp();
    await expect(uncertaintyAt(ines, "TF-2", 9)).rejects.toMatchObject({ code: "not_found" });
  });
});

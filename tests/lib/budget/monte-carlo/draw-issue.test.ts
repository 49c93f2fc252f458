import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { drawIssue, DrawIssueInput, monteCarloInputHash } from "@/lib/budget/monte-carlo/draw-issue";
import { buildMonteCarloWorker } from "@/scripts/readiness/monte-carlo-worker.mjs";
import { addItem, approve, establish, fixedItem } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { sideFairing, signPanel } from "@/tests/support/demo-budgets";
import { person, product, withRole } from "@/tests/support/people";

withDatabase();

const folder = mkdtempSync(path.join(os.tmpdir(), "leeboard-draw-"));
const workerFile = path.join(folder, "worker.mjs");
const INPUT: DrawIssueInput = { productCode: "TF-2", issue: "newest", operatingPoint: "OP-1", draws: 4000, seed: 5 };

beforeAll(() => buildMonteCarloWorker(workerFile));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function lampOnFile() {
  await product("TF-2");
  const tansy = await withRole(await person("Tansy Merle"), "TF-2", "component_owner");
  const ines = await withRole(await person("Ines Maat"), "TF-2", "reviewer");
  const lusia = await withRole(await person("Lusia Brand"), "TF-2", "program_manager");
  await establish(lusia, "TF-2", "2026-03-01T09:00:00.000Z");
  await approve("TF-2", "2026-03-10T09:00:00.000Z", {
    proposer: tansy,
    signers: [
      [ines, "reviewer"],
      [lusia, "program_manager"],
    ],
    edits: [addItem("010", fixedItem(tansy.userId, 3, { force: { value: 3, standardUncertainty: 0.4 } }))],
  });
  return ines;
}

describe("drawing an issue", () => {
  it("gives its outcome with the issue and a hash of what it was drawn from", async () => {
    const ines = await lampOnFile();
    const drawn = await drawIssue(ines, INPUT, { workerFile });
    expect(drawn).toMatchObject({ issue: 2, outcome: { operatingPoint: "OP-1", draws: 4000, seed: 5 } });
    if ("refused" in drawn.outcome) throw new Error("refused");
    // A normal force: five standard errors of its mean and of its deviation.
    expect(Math.abs(drawn.outcome.basic.mean - 3)).toBeLessThan((5 * 0.4) / Math.sqrt(4000));
    expect(Math.abs(drawn.outcome.basic.standardDeviation - 0.4)).toBeLessThan((5 * 0.4) / Math.sqrt(8000));

    const again = await drawIssue(ines, { ...INPUT, issue: 2 }, { workerFile });
    expect(again).toEqual(drawn);
  });

  it("hashes everything that was drawn from", () => {
    const job = { state: sideFairing(), operatingPoint: "OP-1", draws: 4000, seed: 5 };
    const others = [job, { ...job, seed: 6 }, { ...job, draws: 4001 }, { ...job, operatingPoint: "OP-2" }];
    const hashes = [...others, { ...job, state: signPanel() }].map(monteCarloInputHash);
    expect(new Set(hashes).size).toBe(5);
    expect(monteCarloInputHash({ ...job, state: sideFairing() })).toBe(hashes[0]);
  });

  it("is refused to strangers, and for a point or an issue that is not there", async () => {
    const ines = await lampOnFile();
    const stranger = await person("Otto Veer");
    await expect(drawIssue(stranger, INPUT, { workerFile })).rejects.toMatchObject({ code: "forbidden" });
    const elsewhere = drawIssue(ines, { ...INPUT, operatingPoint: "OP-9" }, { workerFile });
    await expect(elsewhere).rejects.toMatchObject({ code: "not_found" });
    const later = drawIssue(ines, { ...INPUT, issue: 9 }, { workerFile });
    await expect(later).rejects.toMatchObject({ code: "not_found", message: "There is no issue 9 of this budget." });
  });

  it("asks for a number of draws that says something, and for a whole seed", () => {
    expect(DrawIssueInput.safeParse(INPUT).success).toBe(true);
    for (const wrong of [
      { draws: 999 },
      { draws: 1e7 },
      { draws: 1000.5 },
      { seed: -1 },
      { seed: 0.5 },
      { issue: 0 },
    ]) {
      expect(DrawIssueInput.safeParse({ ...INPUT, ...wrong }).success).toBe(false);
    }
  });
});

import { describe, expect, it } from "vitest";
import { measuredAgainstEstimated } from "@/lib/budget/measured-against-estimated";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { addItem, approve, bluffItem, establish, firstPoint } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";
import { cast, type Cast, revise } from "@/tests/support/three-issues";

withDatabase();

const evidence = [{ document: "Sheet 12", revision: "A", date: "2026-03-15" }];
const day = (issue: number) => `2026-03-${String(issue).padStart(2, "0")}T09:00:00.000Z`;

async function issue({ tansy, ines, lusia }: Cast, number: number, edits: readonly LineEdit[]): Promise<void> {
  const signers = [
    [ines, "reviewer"],
    [lusia, "program_manager"],
  ] as const;
  await approve("TF-2", day(number), { proposer: tansy, signers, edits });
}

/** 010: estimated with C_D 0.5, then layout with 0.4, then measured with 0.44, each on 0.1 m². */
async function measuredItem(people: Cast): Promise<void> {
  const own = people.tansy.userId;
  await establish(people.lusia, "TF-2", day(1));
  await issue(people, 2, [addItem("010", bluffItem(own, 0.5, 0.1))]);
  await issue(people, 3, [revise("010", "–", bluffItem(own, 0.4, 0.1, { grade: "layout", evidence }))]);
  await issue(people, 4, [revise("010", "A", bluffItem(own, 0.44, 0.1, { grade: "measured_actual", evidence }))]);
}

describe("measured against estimated", () => {
  it("pairs the first measured value with the last estimate of each grade, as the issues keep them", async () => {
    const people = await cast();
    await measuredItem(people);
    const { pairs, leftOut, suggestions } = await measuredAgainstEstimated(people.ines, "TF-2");
    expect(leftOut).toBe(0);
    expect(pairs.map(({ grade, estimateIssue, measuredIssue }) => [grade, estimateIssue, measuredIssue])).toEqual([
      ["estimated", 2, 4],
      ["layout", 3, 4],
    ]);
    // Drag goes with C_D: from 0.5 to 0.44 is −12 %, from 0.4 it is +10 %.
    expect(pairs.map(({ estimate, measured }) => measured / estimate - 1)).toEqual([
      expect.closeTo(-0.12, 9),
      expect.closeTo(0.1, 9),
    ]);
    expect(suggestions.find(({ grade }) => grade === "layout")).toMatchObject({ present: 0.15, suggested: null });
  });

  it("leaves out, and counts, what a change of the reference operating point keeps from being compared", async () => {
    const people = await cast();
    const own = people.tansy.userId;
    await establish(people.lusia, "TF-2", day(1));
    await issue(people, 2, [addItem("010", bluffItem(own, 0.5, 0.1))]);
    await issue(people, 3, [revise("010", "–", bluffItem(own, 0.4, 0.1, { grade: "layout", evidence }))]);
    const faster = { ...firstPoint(10000), speed: { value: 30, entered: "30 m/s" } };
    await issue(people, 4, [
      { operation: "revise", kind: "operating_point", number: "OP-1", baseLetter: "–", body: faster },
    ]);
    await issue(people, 5, [revise("010", "A", bluffItem(own, 0.44, 0.1, { grade: "measured_actual", evidence }))]);

    const { pairs, leftOut } = await measuredAgainstEstimated(people.ines, "TF-2");
    // The estimate of grade layout was still in force at the new speed, that of grade estimated was not.
    expect(pairs.map(({ grade, estimateIssue }) => [grade, estimateIssue])).toEqual([["layout", 4]]);
    expect(leftOut).toBe(1);
  });

  it("is for those who may read the budget", async () => {
    const people = await cast();
    await measuredItem(people);
    await expect(measuredAgainstEstimated(await person("Maud"), "TF-2")).rejects.toMatchObject({ code: "forbidden" });
  });
});

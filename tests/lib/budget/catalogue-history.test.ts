import { describe, expect, it } from "vitest";
import { catalogueHistory } from "@/lib/budget/catalogue-history";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { FINISH_CATALOGUE } from "@/lib/products/finish-catalogue";
import { approve, establish } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";
import { cast, type Cast, ISSUE_1, ISSUE_2, ISSUE_3 } from "@/tests/support/three-issues";

withDatabase();

const rougher: LineEdit = {
  operation: "revise",
  kind: "finish",
  number: "F30",
  baseLetter: "–",
  body: { name: "Smooth paint, carefully applied", roughness: { value: 12e-6, entered: "12 µm" }, source: "Replica 7" },
};
const retired: LineEdit = { operation: "retire", kind: "finish", number: "F90", baseLetter: "–", body: null };

async function twoChanges({ lusia, ines }: Cast): Promise<void> {
  await establish(lusia, "TF-2", ISSUE_1);
  const change = { proposer: lusia, signers: [[ines, "reviewer"]] as const };
  await approve("TF-2", ISSUE_2, { ...change, title: "Replicas of the paint", edits: [rougher] });
  await approve("TF-2", ISSUE_3, { ...change, title: "No cast parts", edits: [retired] });
}

describe("the history of the finish catalogue", () => {
  it("has a version for each issue that touches a finish, newest first, with what moved, why and by whom", async () => {
    const people = await cast();
    await twoChanges(people);
    const [third, second, first] = await catalogueHistory(people.ines, "TF-2", 3);
    expect(first).toMatchObject({ version: 1, inForce: FINISH_CATALOGUE.length, issue: { number: 1, proposal: null } });
    expect(first?.changes.map(({ finish }) => finish)).toEqual(FINISH_CATALOGUE.map(({ number }) => number));
    expect(second).toMatchObject({
      version: 2,
      issue: { number: 2, proposal: { title: "Replicas of the paint" }, signatures: [{ printedName: "Ines Maat" }] },
      changes: [{ finish: "F30", letterWas: "–", letterNow: "A", moved: null }],
    });
    const roughness = second?.changes[0]?.fields.find(({ field }) => field === "roughness");
    expect(roughness).toMatchObject({ was: "6", now: "12", unit: "µm" });
    expect(third).toMatchObject({
      version: 3,
      inForce: FINISH_CATALOGUE.length - 1,
      changes: [{ finish: "F90", letterNow: "A", moved: "retired", fields: [] }],
    });
  });

  it("ends with the issue that is asked for, and is for those who may read the budget", async () => {
    const people = await cast();
    await twoChanges(people);
    expect((await catalogueHistory(people.lusia, "TF-2", 2)).map(({ version }) => version)).toEqual([2, 1]);
    const stranger = await person("Someone Else");
    await expect(catalogueHistory(stranger, "TF-2", 3)).rejects.toMatchObject({ code: "forbidden" });
  });
});

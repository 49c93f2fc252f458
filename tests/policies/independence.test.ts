import { describe, expect, it } from "vitest";
import { barredPersons, demandIndependence, isBarred } from "@/policies/independence";
import { signingRights, type SigningFacts } from "@/policies/signing-rights";

const PROPOSER = 1;
const EDITOR = 2;
const OWNER_BEFORE = 3;
const OWNER_AFTER = 4;
const FREE = 5;

const barred = barredPersons({
  proposerId: PROPOSER,
  editorIds: [PROPOSER, EDITOR],
  owners: [
    { item: "030", ownerId: OWNER_BEFORE },
    { item: "030", ownerId: OWNER_AFTER },
    { item: "040", ownerId: PROPOSER },
  ],
});

describe("independence", () => {
  it("bars the proposer, all who edited, and the owners before and after, and nobody else", () => {
    const people = [PROPOSER, EDITOR, OWNER_BEFORE, OWNER_AFTER, FREE];
    expect(people.filter((person) => isBarred(person, barred))).toEqual([1, 2, 3, 4]);
  });

  it("says every cause once", () => {
    expect(barred.map(({ because }) => because)).toEqual([
      "as its proposer and as owner of item 040",
      "as one who edited it",
      "as owner of item 030",
      "as owner of item 030",
    ]);
  });

  it("refuses a barred person in their own right and as anybody's deputy", () => {
    const refusal = { code: "not_independent" };
    expect(() => demandIndependence(EDITOR, null, barred)).toThrow(expect.objectContaining(refusal));
    const free = { userId: 6, printedName: "Somebody Free" };
    expect(() => demandIndependence(EDITOR, free, barred)).toThrow(expect.objectContaining(refusal));
  });

  it("refuses a deputy for a barred person, who may sign in their own right", () => {
    const owner = { userId: OWNER_AFTER, printedName: "New Owner" };
    expect(() => demandIndependence(FREE, owner, barred)).toThrow(
      "New Owner is barred as owner of item 030; a deputy cannot sign for a barred person.",
    );
    expect(() => demandIndependence(FREE, null, barred)).not.toThrow();
  });
});

describe("deputies", () => {
  const FACTS: SigningFacts = {
    members: [
      { userId: 10, printedName: "Manager", roles: ["program_manager"] },
      { userId: 11, printedName: "Deputy", roles: ["component_owner"] },
      { userId: 12, printedName: "Auditor", roles: ["auditor"] },
      { userId: 13, printedName: "Deputy's deputy", roles: ["reviewer"] },
    ],
    deputies: [
      { deputyId: 11, forUserId: 10 },
      { deputyId: 12, forUserId: 10 },
      { deputyId: 13, forUserId: 11 },
      { deputyId: 99, forUserId: 10 },
    ],
    barred: [],
    namedReviewerId: null,
  };

  it("sign for the holder of the role with both names; the office is not passed on, and takes a role here", () => {
    expect(signingRights("program_manager", FACTS)).toEqual([
      { userId: 10, printedName: "Manager", capacity: "program_manager", deputyFor: null },
      {
        userId: 11,
        printedName: "Deputy",
        capacity: "program_manager",
        deputyFor: { userId: 10, printedName: "Manager" },
      },
    ]);
  });

  it("cannot sign for a barred person, nor when barred themselves", () => {
    const because = "as its proposer";
    expect(signingRights("program_manager", { ...FACTS, barred: [{ userId: 10, because }] })).toEqual([]);
    const rights = signingRights("program_manager", { ...FACTS, barred: [{ userId: 11, because }] });
    expect(rights.map(({ userId }) => userId)).toEqual([10]);
  });
});

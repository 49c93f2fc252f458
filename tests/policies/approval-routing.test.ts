import { describe, expect, it } from "vitest";
import { DEFAULT_REVIEW_RULES, type ReviewRules } from "@/lib/vocabulary/review-rules";
import { grownRouting, requiredCapacities, routeCapacities } from "@/policies/approval-routing";
import type { RoutingRule } from "@/policies/program-manager-reasons";
import type { EarlierMove, RoutingEdit, RoutingFacts, RoutingPoint } from "@/policies/routing-facts";
import type { SigningFacts } from "@/policies/signing-rights";

/** Limit 100 N, reserve 10 N: 1 % of the limit is 1.00 N. */
const POINT: RoutingPoint = {
  operatingPoint: "OP-1",
  limit: 100,
  predictedBefore: 80,
  predictedAfter: 80,
  marginBefore: 20,
  marginAfter: 20,
  standingBefore: "inside",
  standingAfter: "inside",
};
const EDIT: RoutingEdit = {
  operation: "revise",
  kind: "item",
  number: "030",
  changedFields: ["length"],
  gradeBefore: "layout",
  gradeAfter: "layout",
};
const PLAIN: RoutingFacts = {
  rules: DEFAULT_REVIEW_RULES,
  edits: [EDIT],
  transfers: 0,
  movesAllocations: false,
  points: [POINT],
  releases: [],
  newRangeCautions: [],
  earlierMoves: [],
};

const withEdits = (...edits: Partial<RoutingEdit>[]): RoutingFacts => ({
  ...PLAIN,
  edits: edits.map((edit) => ({ ...EDIT, ...edit })),
});
const withPoint = (point: Partial<RoutingPoint>): RoutingFacts => ({ ...PLAIN, points: [{ ...POINT, ...point }] });
/** Predicted rises by so many newtons, well inside. */
const rising = (newtons: number): Partial<RoutingPoint> => ({
  predictedAfter: 80 + newtons,
  marginAfter: 20 - newtons,
});
const earlier = (move: Partial<EarlierMove>): EarlierMove => ({
  item: "030",
  operatingPoint: "OP-1",
  issue: 5,
  predicted: 0,
  released: 0,
  programManagerSigned: false,
  ...move,
});
const release = (released: number) => [{ item: "030", operatingPoint: "OP-1", released }];

/** One change per rule that sets off this rule and no other. */
const ALONE: Record<Exclude<RoutingRule, "reviewer">, RoutingFacts> = {
  terms: withEdits({ kind: "terms", number: "TM", changedFields: ["countSize"], gradeBefore: null, gradeAfter: null }),
  limit: withEdits({ kind: "operating_point", number: "OP-1", changedFields: ["limitHundredths"] }),
  operatingPointState: withEdits({ kind: "operating_point", number: "OP-1", changedFields: ["speed"] }),
  finish: withEdits({ kind: "finish", number: "F10", changedFields: ["roughness"] }),
  allocations: { ...PLAIN, edits: [], transfers: 1 },
  addOrRetire: withEdits({ operation: "retire", changedFields: [] }),
  gradeSteps: withEdits({ changedFields: ["grade"], gradeBefore: "estimated", gradeAfter: "preliminary" }),
  measuredGrade: withEdits({ changedFields: ["grade"], gradeBefore: "released", gradeAfter: "measured_like_part" }),
  releasedGrowthPercent: {
    ...withEdits({ changedFields: ["grade"], gradeBefore: "layout", gradeAfter: "preliminary" }),
    releases: release(1),
  },
  rangeCaution: { ...PLAIN, newRangeCautions: [{ item: "030", operatingPoint: "OP-1" }] },
  predictedRisePercent: withPoint(rising(1)),
  standingWorse: withPoint({
    predictedBefore: 89.5,
    predictedAfter: 90.4,
    marginBefore: 10.5,
    marginAfter: 9.6,
    standingAfter: "into_the_reserve",
  }),
};
const RULES = Object.entries(ALONE).map(([rule, facts]) => [rule, facts] as const);

const { windowDays: _, ...RULE_NAMES } = DEFAULT_REVIEW_RULES.programManagerOn;

const rulesAsked = (facts: RoutingFacts) =>
  requiredCapacities(facts, false)
    .filter(({ capacity }) => capacity === "program_manager")
    .flatMap(({ reasons }) => reasons.map(({ rule }) => rule));

describe("what routes where", () => {
  it("asks one independent reviewer always and nobody else for a plain revision", () => {
    expect(requiredCapacities(PLAIN, false)).toMatchObject([
      { capacity: "reviewer", count: 1, reasons: [{ sentence: "One independent reviewer always." }] },
    ]);
  });

  it("never asks fewer than one reviewer, whatever the rules say", () => {
    const rules: ReviewRules = { ...DEFAULT_REVIEW_RULES, reviewers: 0 };
    expect(requiredCapacities({ ...PLAIN, rules }, false)[0]?.count).toBe(1);
  });

  it.each(RULES)("asks a program manager for the rule %s alone, and the reviewer stays", (rule, facts) => {
    expect(rulesAsked(facts)).toEqual([rule]);
    expect(requiredCapacities(facts, false).map(({ capacity }) => capacity)).toEqual(["reviewer", "program_manager"]);
  });

  it.each(RULES)("does not ask for the rule %s when the terms switch it off", (rule, facts) => {
    const isNumber = ["gradeSteps", "releasedGrowthPercent", "predictedRisePercent"].includes(rule);
    const programManagerOn = { ...DEFAULT_REVIEW_RULES.programManagerOn, [rule]: isNumber ? 0 : false };
    expect(rulesAsked({ ...facts, rules: { ...DEFAULT_REVIEW_RULES, programManagerOn } })).toEqual([]);
  });

  const pairs = RULES.flatMap(([one, a], i) => RULES.slice(i + 1).map(([two, b]) => [one, two, a, b] as const));
  it.each(pairs)("gives both reasons where %s and %s meet", (one, two, a, b) => {
    const touched = (facts: RoutingFacts) => facts.points[0] !== POINT;
    const facts: RoutingFacts = {
      ...PLAIN,
      edits: [...a.edits.map((edit) => ({ ...edit, number: `A${edit.number}` })), ...b.edits],
      transfers: a.transfers + b.transfers,
      points: [
        ...(touched(a) ? a.points : [POINT]),
        ...(touched(b) ? b.points.map((point) => ({ ...point, operatingPoint: "OP-2" })) : []),
      ],
      releases: [...a.releases, ...b.releases],
      newRangeCautions: [...a.newRangeCautions, ...b.newRangeCautions],
    };
    expect([...new Set(rulesAsked(facts))].sort()).toEqual([one, two].sort());
  });

  it("is tested for every rule of the list", () => {
    expect(Object.keys(ALONE).sort()).toEqual(Object.keys(RULE_NAMES).sort());
  });

  it("says why in words with the number that decided it", () => {
    const [, manager] = requiredCapacities(withPoint(rising(1.27)), false);
    expect(manager?.reasons[0]?.sentence).toBe("Predicted rises by 1.27 N at OP-1, 1 % of the limit or more.");
  });
});

describe("thresholds, on values rounded to 0.01 N", () => {
  it.each([
    [0.994, []],
    [0.995, ["predictedRisePercent"]],
    [1, ["predictedRisePercent"]],
    [-5, []],
  ])("a rise by %d N of a limit of 100 N", (newtons, expected) => {
    expect(rulesAsked(withPoint(rising(newtons)))).toEqual(expected);
  });

  it("counts along what was approved for the same item in the window", () => {
    const facts = { ...withPoint(rising(0.6)), earlierMoves: [earlier({ predicted: 0.4 })] };
    expect(rulesAsked(facts)).toEqual(["predictedRisePercent"]);
    expect(rulesAsked({ ...facts, earlierMoves: [earlier({ predicted: 0.39 })] })).toEqual([]);
    expect(rulesAsked({ ...facts, earlierMoves: [earlier({ predicted: 0.4, item: "040" })] })).toEqual([]);
    expect(rulesAsked({ ...facts, earlierMoves: [earlier({ predicted: 0.4, operatingPoint: "OP-2" })] })).toEqual([]);
  });

  it("counts the net of earlier moves, but an earlier fall buys no rise", () => {
    const fell = earlier({ predicted: -0.5, issue: 6 });
    expect(rulesAsked({ ...withPoint(rising(0.6)), earlierMoves: [earlier({ predicted: 0.7 }), fell] })).toEqual([]);
    expect(rulesAsked({ ...withPoint(rising(1)), earlierMoves: [fell] })).toEqual(["predictedRisePercent"]);
  });

  it("counts only since the last move of the item that a program manager signed", () => {
    const signed = earlier({ predicted: 0.9, issue: 6, programManagerSigned: true });
    const facts = { ...withPoint(rising(0.6)), earlierMoves: [earlier({ predicted: 0.4 }), signed] };
    expect(rulesAsked(facts)).toEqual([]);
    const since = earlier({ predicted: 0.4, issue: 7 });
    expect(rulesAsked({ ...facts, earlierMoves: [...facts.earlierMoves, since] })).toEqual(["predictedRisePercent"]);
  });

  it("adds growth released by several items, one proposal after the other", () => {
    const facts: RoutingFacts = {
      ...PLAIN,
      releases: release(0.5),
      earlierMoves: [earlier({ released: 0.5, item: "040" })],
    };
    expect(rulesAsked(facts)).toEqual(["releasedGrowthPercent"]);
    expect(rulesAsked({ ...facts, earlierMoves: [earlier({ released: 0.49 })] })).toEqual([]);
  });

  it("does not ask again for growth when this change releases none", () => {
    expect(rulesAsked({ ...PLAIN, earlierMoves: [earlier({ released: 3 })] })).toEqual([]);
  });

  it("counts grades in steps, and a lowered grade never", () => {
    const grade = (gradeBefore: RoutingEdit["gradeBefore"], gradeAfter: RoutingEdit["gradeAfter"]) =>
      rulesAsked(withEdits({ changedFields: ["grade"], gradeBefore, gradeAfter }));
    expect(grade("layout", "preliminary")).toEqual([]);
    expect(grade("layout", "released")).toEqual(["gradeSteps"]);
    expect(grade("measured_like_part", "measured_actual")).toEqual(["measuredGrade"]);
    expect(grade("measured_actual", "estimated")).toEqual([]);
  });
});

describe("the standing", () => {
  const over = { standingBefore: "over", standingAfter: "over", marginBefore: -5, predictedBefore: 105 } as const;

  it("worsens where the margin falls by 0.01 N at a point that is not inside", () => {
    expect(rulesAsked(withPoint({ ...over, predictedAfter: 105.01, marginAfter: -5.01 }))).toEqual(["standingWorse"]);
    expect(rulesAsked(withPoint({ ...over, predictedAfter: 105.004, marginAfter: -5.004 }))).toEqual([]);
    expect(rulesAsked(withPoint({ ...over, predictedAfter: 104, marginAfter: -4 }))).toEqual([]);
  });

  it("does not worsen where the margin falls and the point stays inside", () => {
    expect(rulesAsked(withPoint(rising(0.5)))).toEqual([]);
  });

  it("worsens with a new operating point that is not inside", () => {
    const added = { predictedBefore: null, marginBefore: null, standingBefore: null } as const;
    expect(rulesAsked(withPoint({ ...added, standingAfter: "over" }))).toEqual(["standingWorse"]);
    expect(rulesAsked(withPoint({ ...added, standingAfter: "inside" }))).toEqual([]);
  });
});

describe("a program manager who submits", () => {
  const manager = (facts: RoutingFacts) =>
    requiredCapacities(facts, true).find(({ capacity }) => capacity === "program_manager");

  it("signs that capacity by submitting what only transfers or regroups", () => {
    expect(manager(ALONE.allocations)?.signedBySubmitting).toBe(true);
    const regroup = { ...withEdits({ changedFields: ["group", "order"] }), movesAllocations: true };
    expect(manager(regroup)?.signedBySubmitting).toBe(true);
    expect(requiredCapacities(ALONE.allocations, true)[0]?.capacity).toBe("reviewer");
  });

  it("needs another program manager for everything else", () => {
    expect(manager({ ...PLAIN, transfers: 1 })?.signedBySubmitting).toBe(false);
    expect(manager(ALONE.terms)?.signedBySubmitting).toBe(false);
    expect(manager({ ...withPoint(rising(2)), edits: [], transfers: 1 })?.signedBySubmitting).toBe(false);
    expect(requiredCapacities(ALONE.allocations, false)[1]?.signedBySubmitting).toBe(false);
  });
});

describe("within a round", () => {
  it("routing only grows, and gives every reason once", () => {
    const earlier = requiredCapacities(ALONE.finish, false);
    const now = requiredCapacities(PLAIN, false);
    expect(grownRouting(earlier, now)).toEqual(earlier);
    expect(grownRouting(now, earlier)).toEqual(earlier);
    const both = grownRouting(earlier, requiredCapacities(ALONE.terms, false));
    expect(both[1]?.reasons.map(({ rule }) => rule)).toEqual(["finish", "terms"]);
  });
});

describe("who may sign, and what is missing", () => {
  const SIGNING: SigningFacts = {
    members: [
      { userId: 1, printedName: "Owner", roles: ["component_owner"] },
      { userId: 2, printedName: "Reviewer", roles: ["reviewer"] },
      { userId: 3, printedName: "Manager", roles: ["program_manager"] },
    ],
    deputies: [],
    barred: [{ userId: 1, because: "as its proposer" }],
    namedReviewerId: null,
  };
  const both = requiredCapacities(ALONE.finish, false);
  const routed = (facts: Partial<SigningFacts>) => routeCapacities(both, { ...SIGNING, ...facts });

  it("is complete where each capacity has a free person of its own", () => {
    expect(routed({}).map(({ missing, maySign }) => [missing, maySign.map(({ userId }) => userId)])).toEqual([
      [null, [2]],
      [null, [3]],
    ]);
  });

  it("names the role that is missing when everybody who holds it is barred", () => {
    const [reviewer, manager] = routed({ barred: [{ userId: 3, because: "as one who edited it" }] });
    expect(reviewer?.missing).toBeNull();
    expect(manager?.missing).toBe("A program manager is missing who took no part in this change.");
  });

  it("needs two persons even where one holds both roles", () => {
    const members = [{ userId: 2, printedName: "Both", roles: ["reviewer", "program_manager"] as const }];
    expect(routed({ members }).map(({ missing }) => missing)).toEqual([
      "One person signs in one capacity: another reviewer is missing who took no part in this change.",
      "One person signs in one capacity: another program manager is missing who took no part in this change.",
    ]);
  });

  it("lets only the named reviewer fill the capacity", () => {
    const members = [...SIGNING.members, { userId: 4, printedName: "Second", roles: ["reviewer"] as const }];
    expect(routed({ members })[0]?.maySign.map(({ userId }) => userId)).toEqual([2, 4]);
    expect(routed({ members, namedReviewerId: 4 })[0]?.maySign.map(({ userId }) => userId)).toEqual([4]);
  });
});

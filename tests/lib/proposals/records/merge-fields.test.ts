import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { mergedBody, mergeFields } from "@/lib/proposals/records/merge-fields";

const base = { name: "Mid panels", length: { value: 3.6, entered: "3.6 m" }, faces: 2, finish: "F10" };

describe("carrying fields onto a newer issue", () => {
  it("lets a field that one side changed carry by itself", () => {
    const theirs = { ...base, finish: "F20" };
    const yours = { ...base, length: { value: 3.2, entered: "3.2 m" } };
    const merges = mergeFields(base, theirs, yours);
    expect(merges.map(({ field, side }) => [field, side])).toEqual([
      ["length", "yours"],
      ["finish", "theirs"],
    ]);
    expect(mergedBody(theirs, merges, new Map())).toEqual({
      ...base,
      finish: "F20",
      length: { value: 3.2, entered: "3.2 m" },
    });
  });

  it("asks where both changed one field to different values, and takes the side that was chosen", () => {
    const theirs = { ...base, faces: 3 };
    const yours = { ...base, faces: 4 };
    const merges = mergeFields(base, theirs, yours);
    expect(merges).toEqual([{ field: "faces", base: 2, theirs: 3, yours: 4, side: "conflict" }]);
    expect(mergedBody(theirs, merges, new Map([["faces", "base"]]))["faces"]).toBe(2);
    expect(mergedBody(theirs, merges, new Map([["faces", "theirs"]]))["faces"]).toBe(3);
    expect(mergedBody(theirs, merges, new Map([["faces", "yours"]]))["faces"]).toBe(4);
  });

  it("sees no conflict where both typed the same length in different units", () => {
    const theirs = { ...base, length: { value: 8.2, entered: "8.2 m" } };
    const yours = { ...base, length: { value: 8.2, entered: "820 cm" } };
    expect(mergeFields(base, theirs, yours).map(({ side }) => side)).toEqual(["both_alike"]);
  });

  it("drops a field that the other side took away and keeps one that it added", () => {
    const theirs = { name: "Mid panels", faces: 2, finish: "F10", dragArea: 0.2 };
    const merges = mergeFields(base, theirs, { ...base, faces: 4 });
    expect(mergedBody(theirs, merges, new Map())).toEqual({ ...theirs, faces: 4 });
  });

  it("gives the same body whichever side a change stands on, as long as nothing conflicts", () => {
    const change = fc.dictionary(fc.constantFrom("a", "b", "c", "d"), fc.integer({ min: 5, max: 9 }));
    fc.assert(
      fc.property(change, change, (one, two) => {
        const start = { a: 1, b: 2, c: 3, d: 4 };
        const left = { ...start, ...one };
        const right = { ...start, ...two };
        const merges = mergeFields(start, left, right);
        fc.pre(merges.every(({ side }) => side !== "conflict"));
        const mirrored = mergeFields(start, right, left);
        expect(mergedBody(left, merges, new Map())).toEqual(mergedBody(right, mirrored, new Map()));
        for (const key of Object.keys(one)) expect(mergedBody(left, merges, new Map())).toHaveProperty(key, one[key]);
      }),
    );
  });
});

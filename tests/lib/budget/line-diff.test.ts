import { applyPatch, parsePatch } from "diff";
import { describe, expect, it } from "vitest";
import { changePatch, lineDiff } from "@/lib/budget/line-diff";

const plate = (length: string, extra = "") => `name: Front panel\nlength: ${length} m\nbreadth: 0.95 m\n${extra}`;
const line = (before: string, after: string) => ({
  name: "item 010",
  letterBefore: before === "" ? null : "A",
  letterAfter: after === "" ? null : "B",
  before,
  after,
});

describe("the patch of a change", () => {
  it("names the line, both revisions and the rows that moved", () => {
    expect(changePatch([line(plate("2.4"), plate("2.6"))])).toBe(
      [
        "--- item 010\trevision A",
        "+++ item 010\trevision B",
        "@@ -1,3 +1,3 @@",
        " name: Front panel",
        "-length: 2.4 m",
        "+length: 2.6 m",
        " breadth: 0.95 m",
        "",
      ].join("\n"),
    );
  });

  it("can be applied again: what the patch says is what happened", () => {
    const [before, after] = [plate("2.4"), plate("2.6", "faces: 2\n")];
    const [patch] = parsePatch(changePatch([line(before, after)]));
    expect(patch && applyPatch(before, patch)).toBe(after);
  });

  it("shows an added and a retired line whole, and leaves out what did not move", () => {
    const patch = changePatch([line("", plate("2.4")), line(plate("1"), plate("1")), line(plate("3"), "")]);
    expect(patch).toContain("--- none\n+++ item 010\trevision B\n@@ -0,0 +1,3 @@\n+name: Front panel");
    expect(patch).toContain("--- item 010\trevision A\n+++ none\n@@ -1,3 +0,0 @@\n-name: Front panel");
    expect(patch.match(/^@@/gm)).toHaveLength(2);
  });

  it("says both texts where they differ too much to be compared in time", () => {
    // Many equal rows in another order: the worst case of the comparison.
    const shuffled = (seed: number) =>
      Array.from({ length: 20_000 }, (_, i) => `row: ${((i + 1) * seed) % 20_011} and ${(i * seed * 7) % 13}`).join(
        "\n",
      );
    const texts = line(shuffled(3), shuffled(7919));
    const started = performance.now();
    expect(lineDiff(texts)).toBeNull();
    const patch = changePatch([texts]);
    expect(performance.now() - started).toBeLessThan(5000);
    expect(patch.split("\n").filter((row) => row.startsWith("+row"))).toHaveLength(20_000);
    expect(patch).toContain("@@ -1,20000 +1,20000 @@");
  });
});

import { describe, expect, it } from "vitest";
import {
  HistoryQuery,
  filterOf,
  historyAddress,
} from "@/app/(workspace)/products/[productCode]/history/_components/history-query";
import { valueLines } from "@/app/(workspace)/products/[productCode]/history/_components/value-lines";
import { issuesQuery } from "@/app/(workspace)/products/[productCode]/issues/_components/issues-query";
import { evidenceAge } from "@/app/(workspace)/products/[productCode]/_sheet/evidence-age";

describe("the address of the issues sheet", () => {
  it("compares two issues in the direction that is asked for, in either spelling", () => {
    expect(issuesQuery({ from: "5", to: "3" }).compare).toEqual({ from: 5, to: 3 });
    expect(issuesQuery({ compare: "3,5" }).compare).toEqual({ from: 3, to: 5 });
  });

  it("compares nothing where one is missing, both are the same or something else is written", () => {
    for (const asked of [{ from: "3" }, { from: "3", to: "3" }, { compare: "3;5" }, { from: "-1", to: "x" }, {}]) {
      expect(issuesQuery(asked).compare).toBeNull();
    }
  });
});

describe("the address of the history", () => {
  it("asks for whole days of UTC, the last one included", () => {
    const query = HistoryQuery.parse({ from: "2026-05-01", until: "2026-05-31", outcome: "refused" });

    expect(filterOf(query)).toEqual({
      outcome: "refused",
      from: "2026-05-01T00:00:00.000Z",
      until: "2026-06-01T00:00:00.000Z",
    });
  });

  it("keeps the question when it turns the page", () => {
    const query = HistoryQuery.parse({ act: "propose", page: "3", person: "" });

    expect(historyAddress("/h", query, 4)).toBe("/h?act=propose&page=4");
    expect(historyAddress("/h", query, 1)).toBe("/h?act=propose");
  });

  it("reads a page that is none as the first", () => {
    for (const page of ["0", "-2", "x", "1e9"]) expect(HistoryQuery.parse({ page }).page).toBe(1);
  });
});

describe("what an entry keeps of before and after", () => {
  it("is printed one field to a line, in words", () => {
    expect(
      valueLines({
        state: "proposed",
        baseIssue: 3,
        hash: { contentHash: "ab" },
        by: ["a", "b"],
        ok: true,
        none: null,
      }),
    ).toEqual(["state: proposed", "base issue: 3", "hash content hash: ab", "by: a, b", "ok: yes", "none: none"]);
    expect(valueLines(null)).toEqual([]);
    expect(valueLines("component_owner")).toEqual(["component owner"]);
  });
});

describe("the age of evidence", () => {
  it("counts whole days up to the day it is read", () => {
    expect(evidenceAge("2026-03-02", new Date("2026-03-12T23:00:00Z"))).toBe(10);
    expect(evidenceAge("2026-03-02", new Date("2026-03-01T00:00:00Z"))).toBe(0);
  });
});

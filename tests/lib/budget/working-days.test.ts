import { describe, expect, it } from "vitest";
import { dayAfter, isWorkingDay, workingDaysAfter } from "@/lib/budget/working-days";

describe("working days", () => {
  it("are Monday to Friday", () => {
    // 1 December 2026 is a Tuesday.
    const week = Array.from({ length: 7 }, (_, index) => isWorkingDay(dayAfter("2026-12-01", index)));
    expect(week).toEqual([true, true, true, true, false, false, true]);
  });

  it("are counted after a day as if one walked from day to day", () => {
    for (const start of ["2026-12-01", "2026-12-04", "2026-12-05", "2026-02-27"]) {
      let walked = 0;
      for (let days = 1; days <= 40; days += 1) {
        if (isWorkingDay(dayAfter(start, days))) walked += 1;
        expect(workingDaysAfter(start, dayAfter(start, days)), `${days} days after ${start}`).toBe(walked);
      }
    }
    expect(workingDaysAfter("2026-12-02", "2026-12-01")).toBe(0);
  });
});

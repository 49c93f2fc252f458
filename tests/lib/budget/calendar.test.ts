import { describe, expect, it } from "vitest";
import { dayIn, endOfDay } from "@/lib/budget/calendar";

describe("days of a product's calendar", () => {
  // Offsets of the IANA time zone database: Amsterdam +1 in winter and +2 in summer, Kiritimati +14, Honolulu −10.
  it.each([
    ["UTC", "2026-05-31", "2026-05-31T23:59:59.999Z"],
    ["Europe/Amsterdam", "2026-01-31", "2026-01-31T22:59:59.999Z"],
    ["Europe/Amsterdam", "2026-05-31", "2026-05-31T21:59:59.999Z"],
    ["Europe/Amsterdam", "2026-03-29", "2026-03-29T21:59:59.999Z"],
    ["Pacific/Kiritimati", "2026-05-31", "2026-05-31T09:59:59.999Z"],
    ["Pacific/Honolulu", "2026-05-31", "2026-06-01T09:59:59.999Z"],
  ])("in %s %s ends at %s", (zone, day, end) => {
    expect(endOfDay(zone, day)).toBe(end);
    expect(dayIn(zone, new Date(end))).toBe(day);
    expect(dayIn(zone, new Date(Date.parse(end) + 1))).not.toBe(day);
  });
});

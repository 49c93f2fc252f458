import { describe, expect, it } from "vitest";
import { calendarText } from "@/lib/proposals/notices/calendar-text";
import { neededByCalendar } from "@/lib/proposals/day-sheet/needed-by-calendar";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, proposed, revising, team } from "../review-cycle";

withDatabase();

/** Reads an iCalendar object by the grammar of RFC 5545, section 3.1: unfolded, then name, parameters and value. */
function readCalendar(text: string): { name: string; parameters: string; value: string }[] {
  expect(text.endsWith("\r\n")).toBe(true);
  const physical = text.slice(0, -2).split("\r\n");
  for (const line of physical) {
    expect(line).not.toMatch(/[\r\n]/);
    expect(Buffer.byteLength(line, "utf8")).toBeLessThanOrEqual(75);
  }
  const unfolded = text.replaceAll(/\r\n[ \t]/g, "");
  return unfolded
    .slice(0, -2)
    .split("\r\n")
    .map((line) => {
      const [, name, parameters, value] = /^([A-Za-z0-9-]+)((?:;[A-Za-z0-9-]+=[^";:,]+)*):(.*)$/.exec(line) ?? [];
      if (name === undefined || parameters === undefined || value === undefined) throw new Error(`no line: ${line}`);
      return { name, parameters, value };
    });
}

/** Undoes the escapes of a TEXT value (section 3.3.11). */
function plain(value: string): string {
  return value.replaceAll(/\\([\\;,nN])/g, (_, mark: string) => (mark.toLowerCase() === "n" ? "\n" : mark));
}

describe("a calendar file", () => {
  it("reads back as it was written: folded lines, escaped texts, days with their end after them", () => {
    const summary = `Needed; "soon", back\\slash ${"é€𝛿".repeat(30)}\nsecond line`;
    const day = { uid: "a@b.invalid", day: "2026-12-31", summary, description: "x", url: "http://127.0.0.1/a;b,c" };
    const text = calendarText([day], new Date("2026-12-01T09:08:07.006Z"));
    const lines = readCalendar(text);
    expect(lines.map(({ name, value }) => (name === "BEGIN" || name === "END" ? `${name} ${value}` : name))).toEqual([
      ...["BEGIN VCALENDAR", "VERSION", "PRODID", "CALSCALE", "METHOD", "BEGIN VEVENT", "UID", "DTSTAMP"],
      ...["DTSTART", "DTEND", "SUMMARY", "DESCRIPTION", "URL", "TRANSP", "END VEVENT", "END VCALENDAR"],
    ]);
    const valueOf = (name: string) => lines.find((line) => line.name === name);
    expect(plain(valueOf("SUMMARY")?.value ?? "")).toBe(summary);
    expect(valueOf("DTSTAMP")).toMatchObject({ parameters: "", value: "20261201T090807Z" });
    expect(valueOf("DTSTART")).toMatchObject({ parameters: ";VALUE=DATE", value: "20261231" });
    expect(valueOf("DTEND")).toMatchObject({ parameters: ";VALUE=DATE", value: "20270101" });
    expect(valueOf("URL")?.value).toBe(day.url);
  });

  it("has the dates that concern its reader, each under a name that stays, and no figure", async () => {
    const people = await team();
    const { tansy, odo, ines, maud, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const edits = [revising("010", "–", tansy.userId, 0.49)];
    await proposed(tansy, clock, { title: "From 22 N to 21 N", edits, neededBy: "2026-05-08" });
    await proposed(tansy, clock, { edits });

    const fileFor = async (reader: typeof tansy, day = "2026-04-01") =>
      readCalendar(await neededByCalendar(reader, { baseUrl: "http://127.0.0.1:3000/" }, () => new Date(day)));
    const valuesOf = (lines: Awaited<ReturnType<typeof fileFor>>, name: string) =>
      lines.filter((line) => line.name === name).map(({ value }) => plain(value));
    const file = await fileFor(ines);
    expect(valuesOf(file, "DTSTART")).toEqual(["20260508"]);
    expect(valuesOf(file, "SUMMARY")).toEqual(["TF-2-CP-02 is needed"]);
    expect(valuesOf(file, "DESCRIPTION")).toEqual(["Sign as reviewer, or return it"]);
    expect(valuesOf(file, "URL")).toEqual(["http://127.0.0.1:3000/products/TF-2/proposals/2"]);
    expect(valuesOf(await fileFor(ines, "2026-04-20"), "UID")).toEqual(valuesOf(file, "UID"));
    expect(valuesOf(await fileFor(tansy), "DESCRIPTION")).toEqual(["It waits for others."]);
    for (const reader of [odo, maud]) expect(valuesOf(await fileFor(reader), "BEGIN")).toEqual(["VCALENDAR"]);
  });
});

import { dayAfter } from "@/lib/budget/working-days";

/** A day by which something is needed. */
export interface CalendarDay {
  /** The same for the same proposal in every file, so that a calendar replaces what it has. */
  uid: string;
  /** "2026-12-20" */
  day: string;
  summary: string;
  description: string;
  url: string;
}

const LINE_OCTETS = 75;
const CRLF = "\r\n";

/** An iCalendar object (RFC 5545) with one all-day event for each day. */
export function calendarText(days: readonly CalendarDay[], at: Date): string {
  const stamp = at.toISOString().replace(/[-:]|\.\d+/g, "");
  const lines = [
    "BEGIN:VCALENDAR",
    "VERSION:2.0",
    "PRODID:-//Leeboard//Needed-by dates//EN",
    "CALSCALE:GREGORIAN",
    "METHOD:PUBLISH",
    ...days.flatMap((day) => eventLines(day, stamp)),
    "END:VCALENDAR",
  ];
  return lines.map((line) => foldedLine(line) + CRLF).join("");
}

function eventLines({ uid, day, summary, description, url }: CalendarDay, stamp: string): string[] {
  return [
    "BEGIN:VEVENT",
    `UID:${uid}`,
    `DTSTAMP:${stamp}`,
    `DTSTART;VALUE=DATE:${compact(day)}`,
    // The end of an event is the first moment after it (section 3.6.1).
    `DTEND;VALUE=DATE:${compact(dayAfter(day))}`,
    `SUMMARY:${escapedText(summary)}`,
    `DESCRIPTION:${escapedText(description)}`,
    `URL:${url}`,
    "TRANSP:TRANSPARENT",
    "END:VEVENT",
  ];
}

function compact(day: string): string {
  return day.replaceAll("-", "");
}

/** TEXT of section 3.3.11: backslash, semicolon, comma and line ends are written with a backslash. */
function escapedText(text: string): string {
  return text
    .replaceAll("\\", "\\\\")
    .replaceAll(";", "\\;")
    .replaceAll(",", "\\,")
    .replace(/\r\n|\r|\n/g, "\\n");
}

/** A line has at most 75 octets without its end; the rest goes on after a blank (section 3.1), no character is cut. */
function foldedLine(line: string): string {
  const encoder = new TextEncoder();
  const parts: string[] = [];
  let part = "";
  let octets = 0;
  for (const character of line) {
    const size = encoder.encode(character).length;
    if (octets + size > LINE_OCTETS) {
      parts.push(part);
      part = " ";
      octets = 1;
    }
    part += character;
    octets += size;
  }
  return [...parts, part].join(CRLF);
}

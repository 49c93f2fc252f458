/** The day (2026-05-31) that a moment falls on in a time zone. */
export function dayIn(timeZone: string, at: Date): string {
  const parts = new Intl.DateTimeFormat("en-CA", {
    timeZone,
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
  }).formatToParts(at);
  const part = (type: string) => parts.find((each) => each.type === type)?.value ?? "";
  return `${part("year").padStart(4, "0")}-${part("month")}-${part("day")}`;
}

/** The last millisecond of a day in a time zone: what stood on that day stood then. */
export function endOfDay(timeZone: string, day: string): string {
  const midnight = Date.parse(`${day}T00:00:00.000Z`);
  // No zone is more than 14 hours off; the last moment that still falls on the day is found by halving.
  let within = midnight - 14 * HOUR;
  let after = midnight + 38 * HOUR;
  while (after - within > 1) {
    const middle = Math.floor((after + within) / 2);
    if (dayIn(timeZone, new Date(middle)) <= day) within = middle;
    else after = middle;
  }
  return new Date(within).toISOString();
}

const HOUR = 3_600_000;

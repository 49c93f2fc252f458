const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** "28 Nov 2026" from ISO text of a day or of a time. */
export function dayText(iso: string): string {
  const match = /^(\d{4})-(\d{2})-(\d{2})/.exec(iso);
  if (!match) return iso;
  const [, year = "", month = "", day = ""] = match;

  return `${Number(day)} ${MONTHS[Number(month) - 1] ?? month} ${year}`;
}

/** "28 Nov 2026, 14:06 UTC" from ISO text in UTC. */
export function utcMinuteText(iso: string): string {
  return `${dayText(iso)}, ${iso.slice(11, 16)} UTC`;
}

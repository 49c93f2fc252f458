const DAY = 86_400_000;

/** Monday to Friday; what else a house keeps as a day off is not known here. */
export function isWorkingDay(day: string): boolean {
  const weekday = new Date(`${day}T00:00:00.000Z`).getUTCDay();
  return weekday !== 0 && weekday !== 6;
}

/** How many working days came after one day, up to another and with it: 0 where it lies before. */
export function workingDaysAfter(day: string, until: string): number {
  const days = Math.floor((Date.parse(until) - Date.parse(day)) / DAY);
  if (days <= 0) return 0;
  const weeks = Math.floor(days / 7);
  const rest = Array.from({ length: days % 7 }, (_, index) => dayAfter(day, weeks * 7 + index + 1));
  return weeks * 5 + rest.filter(isWorkingDay).length;
}

/** The day that many days later. */
export function dayAfter(day: string, days = 1): string {
  return new Date(Date.parse(`${day}T00:00:00.000Z`) + days * DAY).toISOString().slice(0, 10);
}

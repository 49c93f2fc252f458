const DAY = 86_400_000;

/** Days from a document's date to the day it is read; never stored in a result. */
export function evidenceAge(date: string, now: Date): number {
  return Math.max(0, Math.floor((now.getTime() - Date.parse(date)) / DAY));
}

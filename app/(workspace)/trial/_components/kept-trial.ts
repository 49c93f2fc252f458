import { Trial } from "../_trial/setting";

/** Each person's own, so that nobody finds what another one typed in the same tab. */
function keyOf(userId: number): string {
  return `leeboard trial ${userId}`;
}

/** Keeps what is typed in this tab, so that a reload or a sign-out loses nothing; false where the tab may keep nothing. */
export function keepTrial(userId: number, trial: Trial): boolean {
  try {
    window.sessionStorage.setItem(keyOf(userId), JSON.stringify(trial));
    return true;
  } catch {
    return false;
  }
}

export function readTrial(userId: number): Trial | null {
  const text = window.sessionStorage.getItem(keyOf(userId));
  if (text === null) return null;
  try {
    const parsed = Trial.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

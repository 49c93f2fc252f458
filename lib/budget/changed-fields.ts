/** Keys whose values differ between two bodies of one line; a key that only one side has differs. */
export function changedFields(was: object, now: object): string[] {
  const before = new Map<string, unknown>(Object.entries(was));
  const after = new Map<string, unknown>(Object.entries(now));
  const keys = [...new Set([...before.keys(), ...after.keys()])];
  return keys.filter((key) => !sameValue(before.get(key), after.get(key)));
}

/** Equal as JSON, whatever the order of keys; a missing key is the same as one that holds undefined. */
function sameValue(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true;
  if (typeof one !== "object" || typeof other !== "object" || one === null || other === null) return one === other;
  return Array.isArray(one) === Array.isArray(other) && changedFields(one, other).length === 0;
}

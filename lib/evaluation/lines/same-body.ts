/**
 * Whether two bodies say the same, whatever the order of their keys. A key without a value is none, as is one of null: a
 * body stored before its field was made says what an empty field says.
 */
export function sameBody(one: unknown, other: unknown): boolean {
  if (Object.is(one ?? null, other ?? null)) return true;
  if (Array.isArray(one) || Array.isArray(other)) return sameList(one, other);
  if (typeof one !== "object" || typeof other !== "object" || one === null || other === null) return false;

  const [was, now] = [entriesOf(one), entriesOf(other)];
  return was.size === now.size && [...was].every(([key, value]) => now.has(key) && sameBody(value, now.get(key)));
}

function sameList(one: unknown, other: unknown): boolean {
  if (!Array.isArray(one) || !Array.isArray(other) || one.length !== other.length) return false;
  return one.every((value, index) => sameBody(value, other[index]));
}

function entriesOf(body: object): ReadonlyMap<string, unknown> {
  return new Map<string, unknown>(Object.entries(body).filter(([, value]) => value !== undefined && value !== null));
}

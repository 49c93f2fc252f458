function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

/** A quantity's text as typed ("820 cm") is no part of its value. */
function valueKeys(record: Record<string, unknown>): string[] {
  return Object.keys(record).filter((key) => record[key] !== undefined && !(key === "entered" && "value" in record));
}

/** Whether two values of a field say the same, whatever unit they were typed in. An absent field equals null. */
export function sameValue(one: unknown, other: unknown): boolean {
  if (Array.isArray(one) && Array.isArray(other)) {
    return one.length === other.length && one.every((entry, index) => sameValue(entry, other[index]));
  }
  if (isRecord(one) && isRecord(other)) {
    const keys = new Set([...valueKeys(one), ...valueKeys(other)]);
    return [...keys].every((key) => sameValue(one[key], other[key]));
  }
  return (one ?? null) === (other ?? null);
}

/** What an entry keeps of before and after, one line a field: "round: 2". */
export function valueLines(value: unknown, prefix = ""): string[] {
  if (value === null || value === undefined) return [];
  if (Array.isArray(value)) return [`${prefix}${value.map(plain).join(", ")}`];
  if (typeof value === "object") {
    return Object.entries(value).flatMap(([key, part]) =>
      typeof part === "object" && part !== null && !Array.isArray(part)
        ? valueLines(part, `${prefix}${words(key)} `)
        : [`${prefix}${words(key)}: ${Array.isArray(part) ? part.map(plain).join(", ") : plain(part)}`],
    );
  }
  return [`${prefix}${plain(value)}`];
}

function plain(value: unknown): string {
  if (value === null) return "none";
  if (typeof value === "boolean") return value ? "yes" : "no";
  return typeof value === "string" || typeof value === "number"
    ? String(value).replaceAll("_", " ")
    : JSON.stringify(value);
}

/** "contentHash" → "content hash". */
function words(key: string): string {
  return key.replace(/([a-z])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`);
}

import canonicalize from "canonicalize";

/** JSON in the one form of RFC 8785: sorted members, shortest numbers. Not a number, infinity and lone surrogates throw. */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new TypeError("There is nothing to write as JSON.");
  return text;
}

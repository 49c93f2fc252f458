/**
 * JSON in the one form of RFC 8785: members sorted by UTF-16 code units, numbers as ECMAScript prints them, no space.
 * What JSON cannot hold (not a number, infinity, lone surrogates, undefined, functions) throws instead of vanishing;
 * only a member that is undefined is left out, as a column that was not given.
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === "boolean") return String(value);
  if (typeof value === "number") return numberText(value);
  if (typeof value === "string") return stringText(value);
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(",")}]`;
  if (typeof value === "object" && isPlain(value)) return objectText(value);
  throw new TypeError(`JSON cannot hold a value of type ${typeof value}.`);
}

function objectText(value: object): string {
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([one], [other]) => (one < other ? -1 : 1))
    .map(([name, member]) => `${stringText(name)}:${canonicalJson(member)}`);
  return `{${members.join(",")}}`;
}

function numberText(value: number): string {
  if (!Number.isFinite(value)) throw new TypeError(`JSON cannot hold the number ${value}.`);
  return JSON.stringify(value);
}

function stringText(value: string): string {
  if (/\p{Surrogate}/u.test(value)) throw new TypeError("JSON cannot hold a text with half a character.");
  return JSON.stringify(value);
}

/** Dates, maps and rows of the database would be written as something else than they are. */
function isPlain(value: object): boolean {
  const prototype: unknown = Object.getPrototypeOf(value);
  return prototype === null || Object.getPrototypeOf(prototype) === null;
}

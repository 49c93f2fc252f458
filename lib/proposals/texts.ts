import { z } from "zod";

const LONE_SURROGATE = /[\uD800-\uDFFF]/u;
const MAX_NESTING = 50;

/** How deep the deepest line of a Markdown text is nested in quotes and lists. */
export function markdownNesting(text: string): number {
  let deepest = 0;
  for (const line of text.split("\n")) {
    const marks = line.match(/^(?:\s*(?:>|[-*+](?=\s)|\d{1,9}[.)](?=\s)))*/)?.[0] ?? "";
    const quotesAndBullets = (marks.match(/[>*+-]|\d+[.)]/g) ?? []).length;
    const indent = (line.match(/^[ \t]*/)?.[0] ?? "").replaceAll("\t", "    ").length;
    deepest = Math.max(deepest, quotesAndBullets + Math.floor(indent / 2));
  }
  return deepest;
}

/** One kind of line end, so that hashes and comparisons do not depend on who typed it. */
function normalise(text: string): string {
  return text.replace(/\r\n?/g, "\n").trim();
}

/** A text that the database, the canonical form and the mail can all carry. */
function carriable(max: number) {
  return z
    .string()
    .transform(normalise)
    .pipe(
      z
        .string()
        .max(max, `Keep it to ${max.toLocaleString("en-GB")} characters.`)
        .refine((text) => !text.includes("\0"), "Remove the invisible NUL character.")
        .refine((text) => !LONE_SURROGATE.test(text), "Remove the broken character (half of a surrogate pair)."),
    );
}

/** One line of plain text; may be empty when `sentence` is not given. */
export function plainText(max: number, sentence?: string) {
  const text = carriable(max).refine((value) => !value.includes("\n"), "Keep it to one line.");
  return sentence === undefined ? text : text.refine((value) => value.length > 0, sentence);
}

/** A paragraph of plain text that has to say something. */
export function sentenceText(max: number, sentence: string) {
  return carriable(max).refine((value) => value.length >= 3, sentence);
}

/** Markdown of at most 20 kB; deep nesting is refused because it would break the page that prints it. */
export function markdownText(sentence?: string) {
  const text = carriable(20_000)
    .refine((value) => new TextEncoder().encode(value).length <= 20_000, "Keep it to 20 kB.")
    .refine((value) => markdownNesting(value) <= MAX_NESTING, `Nest lists and quotes at most ${MAX_NESTING} deep.`);
  return sentence === undefined ? text : text.refine((value) => value.length >= 3, sentence);
}

/** Control characters, and marks that turn the reading direction so that "fdp.exe" reads as "exe.pdf". */
const DISGUISING = /[\p{Cc}\p{Zl}\p{Zp}\u200b-\u200f\u202a-\u202e\u2060-\u2069\ufeff]/gu;

/** A file's own name, without the folders that some browsers send along. */
export function fileName(max: number) {
  return z
    .string("Name the file.")
    .transform((name) => name.replace(DISGUISING, "").split(/[\\/]/).at(-1) ?? "")
    .transform((name) => name.normalize("NFC").trim())
    .pipe(
      z
        .string()
        .min(1, "Name the file.")
        .max(max, `Keep the file's name to ${max} characters.`)
        .refine((name) => !LONE_SURROGATE.test(name), "Remove the broken character from the file's name.")
        .refine((name) => !/^\.+$/.test(name), "Name the file."),
    );
}

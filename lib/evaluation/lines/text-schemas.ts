import { z } from "zod";

const CONTROL_CHARACTERS = /[\u0000-\u0008\u000b-\u001f\u007f]/;

/** One line of text that must be there. */
export function requiredText(sentence: string, longest: number) {
  return text(sentence, longest).min(1, sentence);
}

export function optionalText(longest: number) {
  return text("Give a text.", longest);
}

function text(sentence: string, longest: number) {
  return z
    .string(sentence)
    .trim()
    .max(longest, `At most ${longest} characters.`)
    .refine((typed) => !CONTROL_CHARACTERS.test(typed), "Contains control characters.");
}

/** A line's number within its product and kind: the author's choice, never reused. */
export const lineNumber = z
  .string("Give a number.")
  .regex(/^[A-Z0-9][A-Z0-9-]{0,11}$/, "Capital letters, digits and hyphens, at most 12, for example 010.");

export const calendarDate = z.iso.date("Give a date such as 2026-03-31.");

/** Whole hundredths of a newton. */
export const hundredths = z.int("Give newtons to 0.01 N.").min(-1e12, "Too small.").max(1e12, "Too large.");

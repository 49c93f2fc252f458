import { z } from "zod";
import { MEASURES, UNIT_SYSTEMS } from "@/lib/vocabulary/measures";

const Typed = z.string().max(200, "A password has at most 200 characters.");

export const NewPassword = z
  .string()
  .min(12, "A password has at least 12 characters.")
  .max(200, "A password has at most 200 characters.")
  .refine((text) => !/[\u0000-\u001f\u007f]/.test(text), "Leave out control characters.");

export const SignInInput = z.strictObject({
  email: z
    .string()
    .trim()
    .toLowerCase()
    .max(254, "Keep it to 254 characters.")
    .pipe(z.email("Give an e-mail address such as name@example.org.")),
  password: Typed.min(1, "Type your password."),
});
export type SignInInput = z.infer<typeof SignInInput>;

export const ChangePasswordInput = z
  .strictObject({ current: Typed.min(1, "Type your present password."), next: NewPassword, again: Typed })
  .refine(({ next, again }) => next === again, {
    path: ["again"],
    message: "The two new passwords differ.",
  })
  .refine(({ current, next }) => current !== next, { path: ["next"], message: "This is your present password." });
export type ChangePasswordInput = z.infer<typeof ChangePasswordInput>;

/** What is left out stays as it is. */
export const KeepPreferencesInput = z.strictObject({
  measure: z.enum(MEASURES, "Choose one of the measures.").optional(),
  units: z.enum(UNIT_SYSTEMS, "Choose SI or US customary units.").optional(),
});
export type KeepPreferencesInput = z.infer<typeof KeepPreferencesInput>;

import { z } from "zod";
import { PRODUCT_KINDS } from "@/lib/vocabulary/lines";
import { ROLES } from "@/lib/vocabulary/roles";

const Id = z.int().positive();

/** One line of text that every store and mail can carry. */
function line(shortest: number, longest: number, sentence: string) {
  return z
    .string()
    .trim()
    .min(shortest, sentence)
    .max(longest, `Keep it to ${longest} characters.`)
    .refine((text) => !/[\u0000-\u001f\u007f]|[\uD800-\uDFFF]/u.test(text), "Remove the control characters.");
}

export const ProductCodeInput = z
  .string()
  .trim()
  .regex(/^[A-Z0-9][A-Z0-9-]{1,11}$/, "Use 2 to 12 capital letters, digits and hyphens, for example TF-2.");

const TimeZone = z
  .string()
  .trim()
  .refine((name) => Intl.supportedValuesOf("timeZone").includes(name) || name === "UTC", "Choose a time zone by name.");

export const CreateProductInput = z.strictObject({
  code: ProductCodeInput,
  name: line(2, 120, "Give the product a name."),
  kind: z.enum(PRODUCT_KINDS, "Choose a kind."),
  timeZone: TimeZone,
});
export type CreateProductInput = z.infer<typeof CreateProductInput>;

export const GiveRoleInput = z.strictObject({
  productCode: ProductCodeInput,
  userId: Id,
  role: z.enum(ROLES, "Choose a role."),
  reason: line(0, 300, "").default(""),
});
export type GiveRoleInput = z.infer<typeof GiveRoleInput>;

export const EndRoleInput = z.strictObject({
  membershipId: Id,
  reason: line(3, 300, "Say in a sentence why the role ends."),
});
export type EndRoleInput = z.infer<typeof EndRoleInput>;

export const CreateAccountInput = z.strictObject({
  email: z
    .string()
    .trim()
    .toLowerCase()
    .max(254, "Keep it to 254 characters.")
    .pipe(z.email("Give an e-mail address such as name@example.org.")),
  name: line(2, 120, "Give the name as it is printed on signatures."),
  password: z
    .string()
    .min(12, "A password has at least 12 characters.")
    .max(200, "A password has at most 200 characters."),
  isAdministrator: z.boolean().default(false),
});
export type CreateAccountInput = z.infer<typeof CreateAccountInput>;

export const DeactivateAccountInput = z.strictObject({
  userId: Id,
  reason: line(3, 300, "Say in a sentence why the account is closed."),
});
export type DeactivateAccountInput = z.infer<typeof DeactivateAccountInput>;

/** The bodies are parsed by the schemas of their lines, so that their faults stand at their own fields. */
export const EstablishProductInput = z.strictObject({
  productCode: ProductCodeInput,
  operatingPoint: z.strictObject({
    number: z.string().regex(/^[A-Z0-9][A-Z0-9-]{0,11}$/, "Use capital letters, digits and hyphens, for example OP-1."),
    body: z.record(z.string(), z.json()),
  }),
  terms: z.record(z.string(), z.json()),
  password: z.string().min(1, "Type your password.").max(200, "This is too long for a password."),
});
export type EstablishProductInput = z.infer<typeof EstablishProductInput>;

const Day = z.iso.date("State the day as 2026-05-31.");

export const NameDeputyInput = z
  .strictObject({ productCode: ProductCodeInput, deputyId: Id, fromDay: Day, untilDay: Day })
  .refine(({ fromDay, untilDay }) => fromDay <= untilDay, {
    path: ["untilDay"],
    error: "This lies before the first day.",
  })
  .refine(({ fromDay, untilDay }) => daysBetween(fromDay, untilDay) <= 366, {
    path: ["untilDay"],
    error: "Name a deputy for a year at most.",
  });
export type NameDeputyInput = z.infer<typeof NameDeputyInput>;

export const EndDeputyInput = z.strictObject({ deputyshipId: Id });
export type EndDeputyInput = z.infer<typeof EndDeputyInput>;

export const MakeBaselineInput = z.strictObject({
  productCode: ProductCodeInput,
  issue: Id,
  name: line(2, 120, "Give the baseline a name, for example Preliminary design."),
  purpose: line(3, 500, "Say in a sentence what it is for."),
  password: z.string().min(1, "Type your password.").max(200, "This is too long for a password."),
});
export type MakeBaselineInput = z.infer<typeof MakeBaselineInput>;

function daysBetween(one: string, other: string): number {
  return (Date.parse(other) - Date.parse(one)) / 86_400_000;
}

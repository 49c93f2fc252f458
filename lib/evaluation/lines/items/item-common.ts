import { z } from "zod";
import { MATURITY_GRADES, MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";
import type { FieldSpec } from "../field-spec";
import { nonNegativeNumber, signedNumber } from "../quantity";
import { calendarDate, lineNumber, optionalText, requiredText } from "../text-schemas";

/** A file that the product holds, by its content: the hash of whatever cites it covers every byte of it. */
export const CitedFile = z.strictObject({
  name: requiredText("Name the file.", 160),
  sha256: z.string("Choose the file again.").regex(/^[0-9a-f]{64}$/, "Choose the file again."),
});
export type CitedFile = z.output<typeof CitedFile>;

/** Without a file the field is missing, as in every citation from before there were files. */
export const EvidenceCitation = z.strictObject({
  document: requiredText("Name the document.", 120),
  revision: requiredText("Say which revision; a dash where it has none.", 40),
  date: calendarDate,
  file: CitedFile.optional(),
});
export type EvidenceCitation = z.output<typeof EvidenceCitation>;

/** Why a note of that code may stand on this item; asked again only where the excess grew. */
export const Justification = z.strictObject({
  code: requiredText("Name the note.", 80),
  text: requiredText("Say in a sentence why this may stand.", 1000),
  excess: signedNumber.default(0),
});
export type Justification = z.output<typeof Justification>;

/** Fields that every item has, whatever its method. */
export const itemCommonShape = {
  name: requiredText("Give the item a name.", 120),
  ownerId: z.int("Choose the owner.").positive("Choose the owner."),
  group: lineNumber.nullable().default(null),
  order: nonNegativeNumber,
  grade: z.enum(MATURITY_GRADES, "Choose a maturity grade."),
  saving: z.boolean("Say yes or no.").default(false),
  methodVersion: z.int().positive(),
  evidence: z.array(EvidenceCitation).max(20, "At most 20 citations.").default([]),
  justifications: z.array(Justification).max(40, "At most 40 justifications.").default([]),
  surface: optionalText(80).default(""),
  stream: optionalText(80).default(""),
  basis: optionalText(500).default(""),
};

export const ITEM_LEADING_FIELDS: readonly FieldSpec[] = [
  { key: "name", label: "Name", type: { type: "text", longest: 120 } },
  { key: "ownerId", label: "Owner", type: { type: "person" } },
  { key: "group", label: "Group", type: { type: "reference", to: "group" }, optional: true },
  { key: "order", label: "Order on the sheet", type: { type: "number" } },
  {
    key: "grade",
    label: "Maturity grade",
    help: "Sets the growth allowance. A grade above estimated needs a citation as evidence.",
    type: { type: "choice", choices: MATURITY_GRADES.map((value) => ({ value, label: MATURITY_GRADE_NAMES[value] })) },
  },
  {
    key: "saving",
    label: "A saving",
    help: "Booked as a negative value of its own, so that totals can be read with and without it.",
    type: { type: "yes-no" },
  },
  { key: "methodVersion", label: "Version of the method", type: { type: "number", whole: true }, fixed: true },
];

export const ITEM_CLOSING_FIELDS: readonly FieldSpec[] = [
  {
    key: "surface",
    label: "Surface it covers",
    help: "The same name on two items says that both stand on it: each is told so, since it may be counted twice.",
    type: { type: "text", longest: 80 },
    optional: true,
  },
  {
    key: "stream",
    label: "Stream along it",
    help: "Tells the two sides of one surface apart, for example “outer” and “inner”.",
    type: { type: "text", longest: 80 },
    optional: true,
  },
  {
    key: "basis",
    label: "Why it is booked here",
    help: "What this item covers and what it leaves to others, so that nothing counts twice.",
    type: { type: "text", longest: 500, multiline: true },
    optional: true,
  },
  {
    key: "evidence",
    label: "Evidence",
    help: "Document, revision and date, with the file where there is one.",
    type: {
      type: "list",
      entry: "Citation",
      of: [
        { key: "document", label: "Document", type: { type: "text", longest: 120 } },
        { key: "revision", label: "Revision", type: { type: "text", longest: 40 } },
        { key: "date", label: "Date", type: { type: "date" } },
        { key: "file", label: "File", type: { type: "file" }, optional: true },
      ],
    },
    optional: true,
  },
  {
    key: "justifications",
    label: "Justifications",
    help: "One for each note that needs one.",
    type: {
      type: "list",
      entry: "Justification of",
      keyedBy: ["code"],
      of: [
        { key: "code", label: "Note", type: { type: "text", longest: 80 }, fixed: true },
        { key: "text", label: "Justification", type: { type: "text", longest: 1000, multiline: true } },
        { key: "excess", label: "Justified up to", type: { type: "number" }, fixed: true },
      ],
    },
    optional: true,
  },
];

/** What a new item starts from, before its method adds its own fields. */
export interface NewItem {
  ownerId: number;
  order: number;
  group: string | null;
}

export function newItemCommon({ ownerId, order, group }: NewItem) {
  return {
    name: "",
    ownerId,
    group,
    order,
    grade: "estimated" as const,
    saving: false,
    methodVersion: 1,
    evidence: [],
    justifications: [],
    surface: "",
    stream: "",
    basis: "",
  };
}

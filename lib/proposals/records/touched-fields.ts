import { z } from "zod";
import { mergeFields } from "./merge-fields";
import type { DraftEdit } from "../schema";

/** Who changed a field last, and when; under "" who put the line into the draft. */
export const TouchedFields = z.record(z.string(), z.strictObject({ userId: z.int(), at: z.string() }));
export type TouchedFields = z.infer<typeof TouchedFields>;

interface Before {
  /** The stored edit's body, or the line's where the draft takes it up now; null of a new line. */
  body: DraftEdit["body"];
  touched: TouchedFields;
  isNew: boolean;
}

/** The marks of an edit after a save: fields that differ from what was stored are its saver's. */
export function touchedAfter(
  before: Before,
  body: DraftEdit["body"],
  by: { userId: number; at: string },
): TouchedFields {
  const taken: TouchedFields = before.isNew ? { "": by } : {};
  const was = before.body;
  const moved = was === null || body === null ? [] : mergeFields(was, was, body);
  return { ...before.touched, ...taken, ...Object.fromEntries(moved.map(({ field }) => [field, by])) };
}

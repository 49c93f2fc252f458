import type { FieldFault } from "@/lib/vocabulary/refusal";
import { LINE_KIND_NAMES, type LineKind } from "@/lib/vocabulary/lines";
import { fieldsOfBody } from "./field-catalogue";
import type { FieldSpec } from "./field-spec";

interface EditedLine {
  kind: LineKind;
  number: string;
  body: object | null;
}

/**
 * A fault of one of several edits with its line and field before it, for a place that stands beside neither. A sentence
 * that names the line by itself stays as it is.
 *
 * @param fault at "edits.2.body.length", say
 */
export function namedFault(edits: readonly EditedLine[], { path, sentence }: FieldFault): string {
  const [, index, rest = ""] = /^edits\.(\d+)(?:\.(.*))?$/.exec(path) ?? [];
  const edit = index === undefined ? undefined : edits[Number(index)];
  if (!edit || (edit.number !== "" && sentence.includes(edit.number))) return sentence;
  const line = `${edit.kind === "item" ? "Item" : capital(LINE_KIND_NAMES[edit.kind])} ${edit.number || "without a number"}`;
  return [line, ...fieldWords(edit, rest.replace(/^body\.?/, ""))].join(", ") + `: ${sentence}`;
}

/** "Length along the flow", or "Evidence", "citation 1", "Date" inside a list. */
export function fieldWords({ kind, body }: Pick<EditedLine, "kind" | "body">, path: string): string[] {
  return body === null ? [] : wordsIn(fieldsOfBody(kind, body), path.split("."));
}

function wordsIn(fields: readonly FieldSpec[], [key, ...inside]: readonly string[]): string[] {
  const field = fields.find((each) => each.key === key);
  if (!field) return [];
  if (field.type.type === "record") return [field.label, ...wordsIn(field.type.of, inside)];
  if (field.type.type !== "list" || inside.length === 0) return [field.label];
  const [entry, ...column] = inside;
  return [field.label, `${field.type.entry} ${Number(entry) + 1}`, ...wordsIn(field.type.of, column)];
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

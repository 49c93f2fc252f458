import type { LineKind } from "@/lib/vocabulary/lines";
import { fieldsOfBody } from "./field-catalogue";
import type { FieldSpec, FieldType } from "./field-spec";
import { fieldText, type FieldText } from "./field-text";
import type { NameBook } from "./name-book";

/** One field of a line as it is printed: what a difference, a remark and an effect are tied to. */
export interface FieldRow extends FieldText {
  /** "length", or "growthTable.released" inside a record, or "reserves.OP-1" inside a list. */
  field: string;
  label: string;
}

/** The fields of a line that matter for it, in the order of its form, printed. */
export function fieldRows(line: { kind: LineKind; body: object }, names: NameBook): FieldRow[] {
  const values = valuesOf(line.body);
  return fieldsOfBody(line.kind, line.body)
    .filter((field) => isShown(field, values))
    .flatMap((field) => rowsOf(field, "", values.get(field.key), names));
}

/** Whether a field matters beside the other values of its body. */
export function isShown({ shownWhen }: FieldSpec, values: ReadonlyMap<string, unknown>): boolean {
  if (!shownWhen) return true;
  const decisive = values.get(shownWhen.field) ?? null;
  return shownWhen.is.some((value) => value === decisive);
}

/** The body without what its form no longer asks: an optional field that another choice hid is empty, not left behind. */
export function withoutHidden<Body extends Readonly<Record<string, unknown>>>(kind: LineKind, body: Body): Body {
  const values = valuesOf(body);
  const hidden = fieldsOfBody(kind, body).filter((field) => field.optional && !isShown(field, values));
  return { ...body, ...Object.fromEntries(hidden.filter(({ key }) => key in body).map(({ key }) => [key, null])) };
}

function rowsOf(field: FieldSpec, prefix: string, value: unknown, names: NameBook): FieldRow[] {
  const path = `${prefix}${field.key}`;
  if (field.type.type === "record") {
    const values = valuesOf(value);
    return field.type.of.flatMap((part) => {
      const rows = rowsOf(part, `${path}.`, values.get(part.key), names);
      return rows.map((row) => ({ ...row, label: `${field.label}: ${row.label}` }));
    });
  }
  if (field.type.type === "list") return listRows(field.label, field.type, path, value, names);
  return [{ field: path, label: field.label, ...fieldText(field.type, value, names) }];
}

type ListType = Extract<FieldType, { type: "list" }>;

function listRows(label: string, type: ListType, path: string, value: unknown, names: NameBook): FieldRow[] {
  if (!Array.isArray(value) || value.length === 0) return [{ field: path, label, text: "none" }];

  return value.map((entry: unknown, index) => {
    const values = valuesOf(entry);
    const keys = (type.keyedBy ?? []).map((key) => String(values.get(key)));
    const columns = type.of.filter((column) => !type.keyedBy?.includes(column.key) && isPresent(column, values));
    const printed = columns.map((column) => ({ column, ...fieldText(column.type, values.get(column.key), names) }));
    const name = keys.length > 0 ? keys.join(" ") : String(index + 1);
    return {
      field: `${path}.${keys.length > 0 ? keys.join("-") : index}`,
      label: `${type.entry} ${name}`,
      ...entryText(printed),
    };
  });
}

/** A citation without a file says nothing of files. */
function isPresent({ key, type }: FieldSpec, values: ReadonlyMap<string, unknown>): boolean {
  return type.type !== "file" || (values.get(key) ?? null) !== null;
}

/** An entry with one column keeps its unit apart; several columns are printed side by side. */
function entryText(printed: readonly (FieldText & { column: FieldSpec })[]): FieldText {
  const [only, ...others] = printed;
  if (only && others.length === 0) return { text: only.text, ...(only.unit === undefined ? {} : { unit: only.unit }) };
  return { text: printed.map(columnText).reduce(beside, "") };
}

/** A typed sentence that ends with its own full stop is followed by a sentence, everything else by a comma. */
function beside(before: string, text: string): string {
  if (before === "") return text;
  return /[.!?]$/.test(before) ? `${before} ${text.charAt(0).toUpperCase()}${text.slice(1)}` : `${before}, ${text}`;
}

/** What the application adds to an entry says what it is; what was typed speaks for itself. */
function columnText({ column, text, unit }: FieldText & { column: FieldSpec }): string {
  const value = unit === undefined ? text : `${text} ${unit}`;
  return column.fixed ? `${column.label.toLowerCase()} ${value}` : value;
}

/** The fields of a body or of a record inside it; of anything else none. */
export function valuesOf(body: unknown): ReadonlyMap<string, unknown> {
  return new Map<string, unknown>(typeof body === "object" && body !== null ? Object.entries(body) : []);
}

import type { LineKind } from "@/lib/vocabulary/lines";
import { DIMENSIONS } from "@/lib/units/dimensions";
import { fieldsOfBody } from "./field-catalogue";
import { valuesOf } from "./field-rows";
import type { FieldSpec, FieldType } from "./field-spec";
import type { NameBook } from "./name-book";

/** What a signature binds: every field in SI, every digit, one `field: value unit` to a row. */
export function canonicalLineText(
  line: { kind: LineKind; number: string; retired: boolean; body: object },
  names: NameBook,
): string {
  const values = valuesOf(line.body);
  const fields = fieldsOfBody(line.kind, line.body).flatMap((field) => rows(field, "", values.get(field.key), names));
  return [`line: ${line.kind} ${line.number}`, `retired: ${line.retired ? "yes" : "no"}`, ...fields].join("\n");
}

function rows(field: FieldSpec, prefix: string, value: unknown, names: NameBook): string[] {
  const path = `${prefix}${field.key}`;
  // Citations from before there were files keep their text.
  if (field.type.type === "file" && value === undefined) return [];
  if (value === null || value === undefined) return [`${path}: none`];
  if (field.type.type === "record") {
    const values = valuesOf(value);
    return field.type.of.flatMap((part) => rows(part, `${path}.`, values.get(part.key), names));
  }
  if (field.type.type === "list" && Array.isArray(value)) {
    const columns = field.type.of;
    if (value.length === 0) return [`${path}: none`];
    return value.flatMap((entry: unknown, index) => {
      const values = valuesOf(entry);
      return columns.flatMap((column) => rows(column, `${path}.${index + 1}.`, values.get(column.key), names));
    });
  }
  return [`${path}: ${exactText(field.type, value, names)}`];
}

function exactText(type: FieldType, value: unknown, names: NameBook): string {
  switch (type.type) {
    case "quantity":
      return quantityText(DIMENSIONS[type.dimension].si, value);
    case "newtons":
      return `${String(value)} hundredths of N`;
    case "number":
      return type.unit === undefined ? String(value) : `${String(value)} ${type.unit}`;
    case "yes-no":
      return value === true ? "yes" : "no";
    case "person":
      return named(String(value), typeof value === "number" ? names.person(value) : null);
    case "reference":
      return named(String(value), names.line(type.to, String(value)));
    case "file":
      return fileText(value);
    case "references":
      return Array.isArray(value) && value.length > 0
        ? value.map((number) => named(String(number), names.line(type.to, String(number)))).join(", ")
        : "none";
    default:
      return oneRow(String(value));
  }
}

function fileText(value: unknown): string {
  const parts = valuesOf(value);
  return `SHA-256 ${String(parts.get("sha256"))}, named "${oneRow(String(parts.get("name")))}"`;
}

function quantityText(unit: string, value: unknown): string {
  const parts = valuesOf(value);
  const spread = parts.get("standardUncertainty");
  const entered = parts.get("entered");
  return [
    `${String(parts.get("value"))} ${unit}`,
    ...(spread === undefined ? [] : [`standard uncertainty ${String(spread)} ${unit}`]),
    ...(typeof entered === "string" ? [`typed "${oneRow(entered)}"`] : []),
  ].join(", ");
}

function named(key: string, name: string | null): string {
  return name === null ? key : `${key} (${oneRow(name)})`;
}

/** No text can pass itself off as a row of its own. */
function oneRow(text: string): string {
  return text.replace(/\\/g, "\\\\").replace(/\r/g, "\\r").replace(/\n/g, "\\n");
}

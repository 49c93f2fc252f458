"use client";

import { Button } from "@/app/_components/button";
import type { FieldTexts } from "@/app/_components/field";
import type { FieldSpec, FieldType } from "@/lib/evaluation/lines/field-spec";

import type { Body } from "./body";
import type { FieldInputProps, RenderField } from "./field-input-props";

interface ListInputProps extends FieldInputProps {
  texts: FieldTexts;
  renderField: RenderField;
  list: Extract<FieldType, { type: "list" }>;
  rows: readonly Body[];
}

/** Rows of fields: citations, reserves, a planned profile. */
export function ListInput({ texts, list, rows, onChange, names, faultAt, path, id, renderField }: ListInputProps) {
  const fields = list.of.filter(({ fixed }) => !fixed);
  const replace = (at: number, row: Body) => onChange(rows.map((old, index) => (index === at ? row : old)));

  return (
    <fieldset id={id} tabIndex={-1} className="min-w-0 border-t border-rule pt-2">
      <legend className="float-left w-full text-sm font-medium">{texts.label}</legend>
      {texts.hint ? <p className="clear-both text-xs text-ink-2">{texts.hint}</p> : null}
      {texts.error ? (
        <p className="clear-both text-sm font-medium text-signal">
          <span aria-hidden>✕ </span>
          {texts.error}
        </p>
      ) : null}
      {rows.map((row, at) => (
        <div key={at} className="clear-both mt-2 flex flex-wrap items-end gap-3">
          {fields.map((spec) => (
            <div key={spec.key} className={spec.type.type === "file" ? "min-w-48 basis-full" : "min-w-32 grow"}>
              {renderField({
                spec,
                value: row[spec.key],
                onChange: (value) => replace(at, { ...row, [spec.key]: value }),
                names,
                faultAt,
                entry: { row, onChange: (changed) => replace(at, changed) },
                path: `${path}.${at}.${spec.key}`,
                id: `${id}-${at}-${spec.key}`,
              })}
            </div>
          ))}
          <Button onClick={() => onChange(rows.filter((_, index) => index !== at))}>Take out</Button>
        </div>
      ))}
      <div className="clear-both mt-2">
        <Button onClick={() => onChange([...rows, emptyRow(list.of)])}>Add: {list.entry.toLowerCase()}</Button>
      </div>
    </fieldset>
  );
}

function emptyRow(fields: readonly FieldSpec[]): Body {
  // A file that is not there is no field at all.
  const typed = fields.filter(({ type }) => type.type !== "file");
  return Object.fromEntries(typed.map(({ key, type }) => [key, type.type === "text" ? "" : null]));
}

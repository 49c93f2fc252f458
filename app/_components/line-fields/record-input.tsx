"use client";

import type { FieldTexts } from "@/app/_components/field";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";

import { type Body, withField } from "./body";
import type { FieldInputProps, RenderField } from "./field-input-props";

interface RecordInputProps extends FieldInputProps {
  texts: FieldTexts;
  renderField: RenderField;
  fields: readonly FieldSpec[];
  record: Body;
}

/** Fields that belong together under one heading: the growth table, the review rules. */
export function RecordInput({
  texts,
  fields,
  record,
  onChange,
  names,
  faultAt,
  path,
  id,
  renderField,
}: RecordInputProps) {
  return (
    <fieldset id={id} tabIndex={-1} className="min-w-0 border-t border-rule pt-2">
      <legend className="float-left w-full text-sm font-medium">{texts.label}</legend>
      {texts.hint ? <p className="clear-both text-xs text-ink-2">{texts.hint}</p> : null}
      <div className="clear-both grid gap-3 pt-1 sm:grid-cols-2">
        {fields.map((spec) => (
          <div key={spec.key}>
            {renderField({
              spec,
              value: record[spec.key],
              onChange: (value) => onChange(withField(record, spec.key, value)),
              names,
              faultAt,
              path: `${path}.${spec.key}`,
              id: `${id}-${spec.key}`,
            })}
          </div>
        ))}
      </div>
    </fieldset>
  );
}

"use client";

import type { FieldTexts } from "@/app/_components/field";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";

import { type Body, withField } from "./body";
import { FieldInput, type FieldInputProps } from "./field-input";

interface RecordInputProps extends FieldInputProps {
  texts: FieldTexts;
  fields: readonly FieldSpec[];
  record: Body;
}

/** Fields that belong together under one heading: the growth table, the review rules. */
export function RecordInput({ texts, fields, record, onChange, names, faultAt, path, id }: RecordInputProps) {
  return (
    <fieldset id={id} tabIndex={-1} className="min-w-0 border-t border-rule pt-2">
      <legend className="float-left w-full text-sm font-medium">{texts.label}</legend>
      {texts.hint ? <p className="clear-both text-xs text-ink-2">{texts.hint}</p> : null}
      <div className="clear-both grid gap-3 pt-1 sm:grid-cols-2">
        {fields.map((spec) => (
          <FieldInput
            key={spec.key}
            spec={spec}
            value={record[spec.key]}
            onChange={(value) => onChange(withField(record, spec.key, value))}
            names={names}
            faultAt={faultAt}
            path={`${path}.${spec.key}`}
            id={`${id}-${spec.key}`}
          />
        ))}
      </div>
    </fieldset>
  );
}

import type { ComponentProps } from "react";

import { CONTROL, Field, type FieldTexts } from "./field";

export interface Choice {
  value: string;
  label: string;
  disabled?: boolean;
}

type ChoiceFieldProps = FieldTexts &
  Omit<ComponentProps<"select">, "aria-describedby" | "aria-invalid" | "children"> & { choices: readonly Choice[] };

/** One of several, in a list that drops down. For two to five short choices prefer `RadioField`. */
export function ChoiceField({ label, hint, error, optional, id, className, choices, ...select }: ChoiceFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} optional={optional} id={id}>
      {(aria) => (
        <select {...select} {...aria} className={[CONTROL, className].filter(Boolean).join(" ")}>
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value} disabled={choice.disabled}>
              {choice.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

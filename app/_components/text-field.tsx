import type { ComponentProps } from "react";

import { CONTROL, Field, type FieldTexts } from "./field";

type TextFieldProps = FieldTexts & Omit<ComponentProps<"input">, "aria-describedby" | "aria-invalid">;

/** One line of text, a date, a password. Works with `register()` of react-hook-form and with plain forms. */
export function TextField({ label, hint, error, optional, id, className, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} optional={optional} id={id}>
      {(aria) => <input {...input} {...aria} className={[CONTROL, className].filter(Boolean).join(" ")} />}
    </Field>
  );
}

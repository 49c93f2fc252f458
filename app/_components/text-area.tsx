import type { ComponentProps } from "react";

import { CONTROL, Field, type FieldTexts } from "./field";

type TextAreaProps = FieldTexts & Omit<ComponentProps<"textarea">, "aria-describedby" | "aria-invalid">;

/** Several lines of plain text. */
export function TextArea({ label, hint, error, optional, id, className, rows = 4, ...area }: TextAreaProps) {
  return (
    <Field label={label} hint={hint} error={error} optional={optional} id={id}>
      {(aria) => (
        <textarea
          {...area}
          {...aria}
          rows={rows}
          className={[CONTROL, "resize-y", className].filter(Boolean).join(" ")}
        />
      )}
    </Field>
  );
}

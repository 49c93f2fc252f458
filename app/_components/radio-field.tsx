import { type ComponentProps, useId } from "react";

import type { Choice } from "./choice-field";
import type { FieldTexts } from "./field";

type RadioFieldProps = Omit<FieldTexts, "optional"> &
  Omit<ComponentProps<"input">, "type" | "value" | "id" | "defaultValue"> & {
    choices: readonly Choice[];
    /** The chosen value of a controlled field; leave out with `register()`. */
    value?: string;
    defaultValue?: string;
  };

/** One of a few, all of them readable at once. */
export function RadioField({ label, hint, error, choices, value, defaultValue, ...input }: RadioFieldProps) {
  const id = useId();

  return (
    <fieldset className="min-w-0" aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="mb-1 text-sm font-medium">{label}</legend>
      <div className="space-y-1">
        {choices.map((choice) => (
          <label key={choice.value} className="flex min-h-7 items-baseline gap-2">
            <input
              {...input}
              type="radio"
              value={choice.value}
              disabled={choice.disabled || input.disabled}
              className="size-4 shrink-0 translate-y-0.5 accent-ink"
              {...(value === undefined
                ? { defaultChecked: defaultValue === undefined ? undefined : choice.value === defaultValue }
                : { checked: choice.value === value })}
            />
            <span>{choice.label}</span>
          </label>
        ))}
      </div>
      {hint ? <p className="mt-1 text-xs text-ink-2">{hint}</p> : null}
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm font-medium text-signal">
          <span aria-hidden>✕ </span>
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}

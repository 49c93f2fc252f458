import { type ComponentProps, useId } from "react";

import type { FieldTexts } from "./field";

type CheckFieldProps = Omit<FieldTexts, "optional"> & Omit<ComponentProps<"input">, "type">;

/** Yes or no. */
export function CheckField({ label, hint, error, id, ...input }: CheckFieldProps) {
  const made = useId();
  const own = id ?? made;

  return (
    <div>
      <label htmlFor={own} className="flex min-h-7 items-baseline gap-2">
        <input
          {...input}
          id={own}
          type="checkbox"
          aria-invalid={error ? true : undefined}
          aria-describedby={error || hint ? `${own}-about` : undefined}
          className="size-4 shrink-0 translate-y-0.5 accent-ink"
        />
        <span>{label}</span>
      </label>
      <div id={`${own}-about`}>
        {hint ? <p className="ml-6 text-xs text-ink-2">{hint}</p> : null}
        {error ? <p className="ml-6 text-sm font-medium text-signal">{error}</p> : null}
      </div>
    </div>
  );
}

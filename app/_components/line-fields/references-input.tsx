"use client";

import type { FieldTexts } from "@/app/_components/field";
import type { LineKind } from "@/lib/vocabulary/lines";

import type { Json } from "./body";
import type { EditorNames } from "./editor-names";

interface ReferencesInputProps extends FieldTexts {
  id: string;
  to: LineKind;
  value: Json | undefined;
  onChange: (value: Json) => void;
  names: EditorNames;
}

/** Several lines of one kind, each to be ticked. */
export function ReferencesInput({ id, to, value, onChange, names, label, hint, error }: ReferencesInputProps) {
  const chosen = Array.isArray(value) ? value.map(String) : [];
  const lines = names.lines.filter(({ kind }) => kind === to);

  return (
    <fieldset id={id} tabIndex={-1} className="min-w-0">
      <legend className="text-sm font-medium">{label}</legend>
      {hint ? <p className="text-xs text-ink-2">{hint}</p> : null}
      <div className="mt-1 max-h-56 overflow-y-auto border border-rule-strong px-2 py-1">
        {lines.map(({ number, name }) => (
          <label key={number} className="flex min-h-7 items-baseline gap-2">
            <input
              type="checkbox"
              className="size-4 shrink-0 translate-y-0.5 accent-ink"
              checked={chosen.includes(number)}
              onChange={(event) =>
                onChange(event.target.checked ? [...chosen, number] : chosen.filter((one) => one !== number))
              }
            />
            <span>
              {number} {name}
            </span>
          </label>
        ))}
      </div>
      {error ? (
        <p className="mt-1 text-sm font-medium text-signal">
          <span aria-hidden>✕ </span>
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}

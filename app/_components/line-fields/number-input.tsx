"use client";

import { useState } from "react";

import { CONTROL, Field, type FieldTexts } from "@/app/_components/field";
import type { FieldType } from "@/lib/evaluation/lines/field-spec";
import { parseNumber } from "@/lib/units/parse-quantity";

import type { Json } from "./body";

type NumberType = Extract<FieldType, { type: "number" | "fraction" | "newtons" }>;

interface NumberInputProps extends FieldTexts {
  id: string;
  type: NumberType;
  value: Json | undefined;
  onChange: (value: Json) => void;
}

/** A number as it is typed; shown in per cent or newtons where it is stored otherwise. */
export function NumberInput({ type, value, onChange, id, ...texts }: NumberInputProps) {
  const [typed, setTyped] = useState(() => shown(type, value));
  const [seen, setSeen] = useState(value);
  // What comes from elsewhere (a choice that sets it, the other copy of a draft) takes the place of what was typed.
  if (value !== seen) {
    setSeen(value);
    if ((value ?? null) !== stored(type, typed)) setTyped(shown(type, value));
  }
  const parsed = typed.trim() === "" ? null : parseNumber(typed);
  const unit = unitOf(type);

  return (
    <Field {...texts} id={id} error={texts.error ?? (parsed && !parsed.ok ? parsed.sentence : undefined)}>
      {(aria) => (
        <div className="flex items-baseline gap-2">
          <input
            {...aria}
            value={typed}
            inputMode="decimal"
            autoComplete="off"
            maxLength={40}
            className={`${CONTROL} max-w-36 text-right`}
            onChange={(event) => {
              setTyped(event.target.value);
              onChange(stored(type, event.target.value));
            }}
          />
          {unit ? <span className="text-sm text-ink-2">{unit}</span> : null}
        </div>
      )}
    </Field>
  );
}

const SCALES: Record<NumberType["type"], number> = { number: 1, fraction: 100, newtons: 0.01 };

function unitOf(type: NumberType): string {
  if (type.type === "fraction") return "%";
  if (type.type === "newtons") return "N";

  return type.unit ?? "";
}

function shown(type: NumberType, value: Json | undefined): string {
  if (typeof value !== "number") return typeof value === "string" ? value : "";

  return String(Number((value * SCALES[type.type]).toPrecision(12)));
}

/** What can't be read is kept as it was typed. */
function stored(type: NumberType, typed: string): Json {
  if (typed.trim() === "") return null;
  const parsed = parseNumber(typed);

  return parsed.ok ? Number((parsed.value / SCALES[type.type]).toPrecision(12)) : typed;
}

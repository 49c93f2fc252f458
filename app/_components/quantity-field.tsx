"use client";

import { type ComponentProps, useState } from "react";

import { DIMENSIONS, type DimensionName } from "@/lib/units/dimensions";

import { CONTROL, Field, type FieldTexts } from "./field";
import { quantityReading } from "./quantity-reading";

type QuantityFieldProps = FieldTexts &
  Pick<ComponentProps<"input">, "id" | "name" | "disabled" | "readOnly" | "onBlur"> & {
    dimension: DimensionName;
    /** The text as typed; reading it is `quantityReading`. */
    value: string;
    onChange: (text: string) => void;
  };

/** A quantity as people write it, "27 ft" or "90 km/h", with what it is in SI beside it. */
export function QuantityField({ dimension, value, onChange, onBlur, error, hint, ...rest }: QuantityFieldProps) {
  const { label, optional, id, ...input } = rest;
  // A half-typed number is no mistake: the reading's complaint waits until the field is left.
  const [typing, setTyping] = useState(false);
  const reading = quantityReading(value, dimension);
  const complaint = !typing && reading.state === "unread" ? reading.sentence : undefined;

  return (
    <Field
      label={label}
      optional={optional}
      id={id}
      hint={hint ?? `For example ${DIMENSIONS[dimension].example}.`}
      error={error ?? complaint}
    >
      {(aria) => (
        <div className="flex items-baseline gap-2.5">
          <input
            {...input}
            {...aria}
            value={value}
            inputMode="text"
            autoComplete="off"
            spellCheck={false}
            maxLength={60}
            className={`${CONTROL} max-w-44 text-right`}
            onChange={(event) => {
              setTyping(true);
              onChange(event.target.value);
            }}
            onBlur={(event) => {
              setTyping(false);
              onBlur?.(event);
            }}
          />
          <output htmlFor={aria.id} className="text-sm whitespace-nowrap text-ink-2">
            {reading.state === "read" ? `= ${reading.text}` : ""}
          </output>
        </div>
      )}
    </Field>
  );
}

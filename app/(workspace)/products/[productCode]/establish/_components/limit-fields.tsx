"use client";

import { QuantityField } from "@/app/_components/quantity-field";

import type { EstablishFieldsProps } from "./establish-input";

/** The promise, and the part of it that the program manager holds back. */
export function LimitFields({ values, change, faults }: EstablishFieldsProps) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <QuantityField
        label="Limit"
        hint="The drag that was promised here, for example 310 N."
        dimension="force"
        value={values.limit}
        error={faults.limit}
        onChange={(text) => change("limit", text)}
      />
      <QuantityField
        label="Reserve"
        hint="Part of the limit that is not given out, for example 18 N; it may be 0 N."
        dimension="force"
        value={values.reserve}
        error={faults.reserve}
        onChange={(text) => change("reserve", text)}
      />
    </div>
  );
}

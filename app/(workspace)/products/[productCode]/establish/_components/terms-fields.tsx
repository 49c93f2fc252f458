"use client";

import { QuantityField } from "@/app/_components/quantity-field";
import { RadioField } from "@/app/_components/radio-field";
import { TextField } from "@/app/_components/text-field";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";
import type { ProductKind } from "@/lib/vocabulary/lines";

import type { EstablishFieldsProps } from "./establish-input";
import { GROWTH_FIELDS } from "./establish-values";

/** Growth by maturity grade, and the areas and counts in which drag is read. */
export function TermsFields({ values, change, faults, kind }: EstablishFieldsProps & { kind: ProductKind }) {
  return (
    <div className="space-y-5">
      <fieldset>
        <legend className="mb-1 text-sm font-medium">Growth allowance, % of the basic estimate</legend>
        <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
          {GROWTH_FIELDS.map(({ grade, field }) => (
            <TextField
              key={grade}
              label={MATURITY_GRADE_NAMES[grade]}
              value={values.growth[grade]}
              error={faults[field]}
              inputMode="decimal"
              className="max-w-28 text-right"
              onChange={(event) => change(field, event.target.value)}
            />
          ))}
        </div>
      </fieldset>
      <div className="grid gap-4 sm:grid-cols-2">
        <RadioField
          label="One drag count is"
          name="countSize"
          choices={COUNT_CHOICES}
          value={values.countSize}
          onChange={(event) => change("countSize", event.target.value)}
        />
        <div className="space-y-4">
          <QuantityField
            label="Reference area"
            optional
            hint="For coefficients and counts, for example 9.6 m²."
            dimension="area"
            value={values.referenceArea}
            error={faults.referenceArea}
            onChange={(text) => change("referenceArea", text)}
          />
          <QuantityField
            label="Flow area"
            optional={kind !== "duct"}
            hint="Of a duct: pressure losses become forces on it, for example 3 m²."
            dimension="area"
            value={values.flowArea}
            error={faults.flowArea}
            onChange={(text) => change("flowArea", text)}
          />
        </div>
      </div>
      <p className="text-sm text-ink-2">
        The review rules start from the defaults: one independent reviewer always, a program manager too where limit,
        terms, finishes or allocations are touched. They change by proposal.
      </p>
    </div>
  );
}

const COUNT_CHOICES = [
  { value: "0.001", label: "0.001 of the drag coefficient (road vehicles)" },
  { value: "0.0001", label: "0.0001 (aircraft)" },
];

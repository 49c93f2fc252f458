"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { QuantityField } from "@/app/_components/quantity-field";
import { TextField } from "@/app/_components/text-field";
import { FLUID_CHOICES } from "@/lib/evaluation/lines/fluids";

import type { EstablishFieldsProps } from "./establish-input";

const STATE_FIELDS = [
  {
    field: "staticTemperature",
    label: "Static temperature",
    dimension: "temperature",
    fluids: ["air", "fresh-water", "sea-water"],
  },
  { field: "staticPressure", label: "Static pressure", dimension: "pressure", fluids: ["air"] },
  { field: "density", label: "Density", dimension: "density", fluids: ["custom"] },
  { field: "dynamicViscosity", label: "Dynamic viscosity", dimension: "viscosity", fluids: ["custom"] },
  { field: "speed", label: "Speed", dimension: "speed", fluids: ["air", "fresh-water", "sea-water", "custom"] },
] as const;

/** Where allocations are set: fluid, its state, speed. */
export function PointFields({ values, change, faults }: EstablishFieldsProps) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <TextField
        label="Number"
        hint="Stays with it for ever, for example OP-1."
        value={values.number}
        error={faults.number}
        maxLength={12}
        onChange={(event) => change("number", event.target.value.toUpperCase())}
      />
      <TextField
        label="Name"
        hint="For example motorway, calm air."
        value={values.name}
        error={faults.name}
        maxLength={120}
        onChange={(event) => change("name", event.target.value)}
      />
      <ChoiceField
        label="Fluid"
        value={values.fluid}
        error={faults.fluid}
        choices={FLUID_CHOICES}
        onChange={(event) => change("fluid", event.target.value)}
      />
      {STATE_FIELDS.filter(({ fluids }) => fluids.some((fluid) => fluid === values.fluid)).map(
        ({ field, label, dimension }) => (
          <QuantityField
            key={field}
            label={label}
            dimension={dimension}
            value={values[field]}
            error={faults[field]}
            onChange={(text) => change(field, text)}
          />
        ),
      )}
      <TextField
        label="Hours a year"
        optional
        hint="For the energy a year of things that move."
        value={values.hoursPerYear}
        error={faults.hoursPerYear}
        inputMode="decimal"
        onChange={(event) => change("hoursPerYear", event.target.value)}
      />
    </div>
  );
}

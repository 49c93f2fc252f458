import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { positiveQuantity, signedQuantity } from "../quantity";
import { calendarDate, requiredText } from "../text-schemas";
import { FLUID_CHOICES, FLUIDS } from "../fluids";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";
import { demandSign } from "./saving-sign";

export const MeasuredBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("measured"),
    force: signedQuantity,
    testFluid: z.enum(FLUIDS, "Choose the fluid of the test.").default("air"),
    testTemperature: positiveQuantity.nullable().default(null),
    testPressure: positiveQuantity.nullable().default(null),
    testDensity: positiveQuantity.nullable().default(null),
    testDynamicViscosity: positiveQuantity.nullable().default(null),
    testSpeed: positiveQuantity,
    testDate: calendarDate,
    source: requiredText("Name the test report.", 300),
  })
  .superRefine((body, context) => {
    demandSign(body.saving, body.force, "force", context);
    for (const field of TEST_STATE_OF[body.testFluid]) {
      if (body[field] === null) {
        context.addIssue({
          code: "custom",
          path: [field],
          message: "Needed: a force without the state of its stream says nothing.",
        });
      }
    }
  });
export type MeasuredBody = z.output<typeof MeasuredBody>;

type TestStateField = "testTemperature" | "testPressure" | "testDensity" | "testDynamicViscosity";

const TEST_STATE_OF: Record<(typeof FLUIDS)[number], readonly TestStateField[]> = {
  air: ["testTemperature", "testPressure"],
  "fresh-water": ["testTemperature"],
  "sea-water": ["testTemperature"],
  custom: ["testDensity", "testDynamicViscosity"],
};

export const MEASURED_FIELDS: readonly FieldSpec[] = [
  {
    key: "force",
    label: "Measured force",
    symbol: "F",
    help: "Converted through drag area to each operating point. Negative only on a saving.",
    type: { type: "quantity", dimension: "force" },
  },
  { key: "testFluid", label: "Fluid of the test", type: { type: "choice", choices: FLUID_CHOICES } },
  {
    key: "testTemperature",
    label: "Temperature of the test",
    type: { type: "quantity", dimension: "temperature" },
    optional: true,
    shownWhen: { field: "testFluid", is: ["air", "fresh-water", "sea-water"] },
  },
  {
    key: "testPressure",
    label: "Pressure of the test",
    help: "Absolute, not corrected to sea level.",
    type: { type: "quantity", dimension: "pressure" },
    optional: true,
    shownWhen: { field: "testFluid", is: ["air"] },
  },
  {
    key: "testDensity",
    label: "Density of the test",
    type: { type: "quantity", dimension: "density" },
    optional: true,
    shownWhen: { field: "testFluid", is: ["custom"] },
  },
  {
    key: "testDynamicViscosity",
    label: "Dynamic viscosity of the test",
    type: { type: "quantity", dimension: "viscosity" },
    optional: true,
    shownWhen: { field: "testFluid", is: ["custom"] },
  },
  { key: "testSpeed", label: "Speed of the test", type: { type: "quantity", dimension: "speed" } },
  { key: "testDate", label: "Date of the test", type: { type: "date" } },
  { key: "source", label: "Test report", type: { type: "text", longest: 300 } },
];

export function newMeasured(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "measured" as const,
    force: null,
    testFluid: "air" as const,
    testTemperature: null,
    testPressure: null,
    testDensity: null,
    testDynamicViscosity: null,
    testSpeed: null,
    testDate: "",
    source: "",
  };
}

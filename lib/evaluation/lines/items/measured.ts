import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { fluidStateFaults, type FluidState, type FluidStateField } from "../fluid-state";
import { FLUID_CHOICES, FLUIDS, type Fluid } from "../fluids";
import { positiveQuantity, signedQuantity, type Quantity } from "../quantity";
import { calendarDate, requiredText } from "../text-schemas";
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
    for (const { field, sentence } of fluidStateFaults(testState(body))) {
      context.addIssue({ code: "custom", path: [TEST_FIELDS[field]], message: sentence });
    }
  });
export type MeasuredBody = z.output<typeof MeasuredBody>;

/** A force without the state of its stream says nothing: the test is held to the rules of an operating point. */
const TEST_FIELDS: Record<FluidStateField, string> = {
  staticTemperature: "testTemperature",
  staticPressure: "testPressure",
  pressureAltitude: "testPressure",
  density: "testDensity",
  dynamicViscosity: "testDynamicViscosity",
};

interface TestFields {
  testFluid: Fluid;
  testTemperature: Quantity | null;
  testPressure: Quantity | null;
  testDensity: Quantity | null;
  testDynamicViscosity: Quantity | null;
}

function testState(body: TestFields): FluidState {
  return {
    fluid: body.testFluid,
    staticTemperature: body.testTemperature,
    staticPressure: body.testPressure,
    pressureAltitude: null,
    density: body.testDensity,
    dynamicViscosity: body.testDynamicViscosity,
  };
}

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

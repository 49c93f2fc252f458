import { z } from "zod";
import { from, numberField, oneOfMessage, positive, textField } from "./number-input";

const AIR_TEMPERATURE = from(150, 600, "K");
const AIR_PRESSURE = from(5e3, 1e6, "Pa");
const PRESSURE_ALTITUDE = from(-2000, 20000, "m");
const FRESH_WATER_TEMPERATURE = from(273.15, 373.15, "K");
const SEA_WATER_TEMPERATURE = from(273.15, 313.15, "K");

const speed = { speed: numberField(positive) };

const air = {
  fluid: z.literal("air"),
  staticTemperature: numberField(AIR_TEMPERATURE).optional(),
  staticPressure: numberField(AIR_PRESSURE).optional(),
  pressureAltitude: numberField(PRESSURE_ALTITUDE).optional(),
  ...speed,
};
const freshWater = {
  fluid: z.literal("fresh-water"),
  staticTemperature: numberField(FRESH_WATER_TEMPERATURE),
  ...speed,
};
const seaWater = { fluid: z.literal("sea-water"), staticTemperature: numberField(SEA_WATER_TEMPERATURE), ...speed };
const custom = {
  fluid: z.literal("custom"),
  density: numberField(positive),
  dynamicViscosity: numberField(positive),
  ...speed,
};

const FLUID_MESSAGE = oneOfMessage(["air", "fresh-water", "sea-water", "custom"]);

/** A fluid, its state and its speed, without a name: what a test was run at. */
export const StreamPointInput = z
  .discriminatedUnion(
    "fluid",
    [z.strictObject(air), z.strictObject(freshWater), z.strictObject(seaWater), z.strictObject(custom)],
    { error: FLUID_MESSAGE },
  )
  .superRefine(requireAirState, { when: () => true });

const id = { id: textField() };

/** An operating point of an evaluation: a stream point with its name. */
export const OperatingPointInput = z
  .discriminatedUnion(
    "fluid",
    [
      z.strictObject({ ...id, ...air }),
      z.strictObject({ ...id, ...freshWater }),
      z.strictObject({ ...id, ...seaWater }),
      z.strictObject({ ...id, ...custom }),
    ],
    { error: FLUID_MESSAGE },
  )
  .superRefine(requireAirState, { when: () => true });

/** Air needs its temperature with the pressure, or the pressure altitude in the pressure's place. */
function requireAirState(point: unknown, context: z.RefinementCtx): void {
  if (typeof point !== "object" || point === null || !("fluid" in point) || point.fluid !== "air") return;
  const has = (field: string): boolean => new Map<string, unknown>(Object.entries(point)).get(field) !== undefined;
  const fault = (field: string, message: string): void => context.addIssue({ code: "custom", path: [field], message });

  if (has("staticPressure") && has("pressureAltitude")) {
    fault("pressureAltitude", "must not stand beside staticPressure: give one of the two");
  }
  if (!has("staticPressure") && !has("pressureAltitude")) {
    fault("staticPressure", "is required, or pressureAltitude in its place");
  }
  if (!has("staticTemperature") && !has("pressureAltitude")) fault("staticTemperature", "is required");
}

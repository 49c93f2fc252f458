import { z } from "zod";

/** A dimensional number: SI value, the text as it was typed, and how well it is known. */
export interface Quantity {
  value: number;
  entered?: string | undefined;
  standardUncertainty?: number | undefined;
}

const LARGEST = 1e12;
/** What must be greater than 0 and lies below this is taken for a slip. */
export const SMALLEST_POSITIVE = 1e-12;

const anyNumber = z
  .number("Give a number.")
  .max(LARGEST, "Too large: beyond 10¹².")
  .min(-LARGEST, "Too small: beyond −10¹².");

export const positiveNumber = anyNumber.min(SMALLEST_POSITIVE, "Must be greater than 0.");
export const nonNegativeNumber = anyNumber.min(0, "Must be 0 or greater.");
export const signedNumber = anyNumber;
export const fractionNumber = anyNumber.min(0, "Must be 0 or greater.").max(1, "At most 1, which is 100 %.");

function quantityOf(value: z.ZodNumber) {
  return z.strictObject(
    {
      value,
      entered: z.string().max(40, "At most 40 characters.").optional(),
      standardUncertainty: nonNegativeNumber.optional(),
    },
    { error: (issue) => (issue.code === "invalid_type" ? "Give a value." : undefined) },
  );
}

export const positiveQuantity = quantityOf(positiveNumber);
export const nonNegativeQuantity = quantityOf(nonNegativeNumber);
/** Nothing built is rougher than 0.1 m: a greater number is one in µm that lost its unit. */
export const roughnessQuantity = quantityOf(nonNegativeNumber.max(0.1, "Rougher than 0.1 m: check the unit."));
export const signedQuantity = quantityOf(signedNumber);
/** How well a coefficient without dimension is known; null where nothing is said. */
export const coefficientUncertainty = nonNegativeNumber.nullable().default(null);

import { z } from "zod";

import { ProductCodeInput } from "@/lib/products/schema";

/** A check of a product's chain, against a head noted outside if there is one. */
export const CheckHistoryInput = z
  .strictObject({
    productCode: ProductCodeInput,
    sequence: z.int("Give the number of the entry.").positive("Give the number of the entry.").nullable(),
    hash: z
      .string()
      .trim()
      .regex(/^[0-9a-f]{64}$/, "Give all 64 signs of the hash.")
      .nullable(),
  })
  .refine(({ sequence, hash }) => (sequence === null) === (hash === null), {
    path: ["sequence"],
    message: "Give both, the number of the entry and its hash, or neither.",
  });

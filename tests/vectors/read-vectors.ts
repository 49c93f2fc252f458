import { readFileSync } from "node:fs";
import path from "node:path";
import { z } from "zod";

const Vectors = z.object({
  cases: z.array(
    z.object({
      inputs: z.record(z.string(), z.unknown()),
      expected: z.record(z.string(), z.unknown()),
      tolerance_relative: z.number(),
      kind: z.string().optional(),
      table: z.string().optional(),
      flag: z.string().optional(),
    }),
  ),
});

export type VectorCase = z.infer<typeof Vectors>["cases"][number];

/** Cases of one reference file. Its own tolerance stands in each. */
export function readVectors(file: string): VectorCase[] {
  return Vectors.parse(JSON.parse(readFileSync(path.join(__dirname, file), "utf8"))).cases;
}

export function numberAt(record: Record<string, unknown>, key: string): number {
  const value = record[key];
  if (typeof value !== "number") throw new Error(`no number at ${key}`);
  return value;
}

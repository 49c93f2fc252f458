import type { Transaction } from "sequelize";
import { trendPoints } from "@/lib/budget/trend";
import type { RegisterEntry, TrendPoint } from "@/lib/budget/views";
import type { Actor } from "@/lib/vocabulary/actor";
import { inSnapshot } from "@/models/database";
import { registerFor } from "./queries";

/** The worst operating point of a product at one of its issues. */
export interface SparkPoint extends TrendPoint {
  issue: number;
}

export interface RegisterSheetEntry extends RegisterEntry {
  /** At the operating point that stands worst now, over the newest issues, oldest first; empty where there is none. */
  trend: SparkPoint[];
}

/** A spark line is a finger wide: more issues than this can't be told apart on it. */
const SPARK_ISSUES = 40;

/** The register with what has become of each product over its issues. */
export async function registerSheet(actor: Actor): Promise<RegisterSheetEntry[]> {
  const entries = await registerFor(actor);
  return inSnapshot(async (tx) => {
    const sheet: RegisterSheetEntry[] = [];
    for (const entry of entries) sheet.push({ ...entry, trend: await trendAtWorst(entry, tx) });
    return sheet;
  });
}

async function trendAtWorst({ product, worst }: RegisterEntry, tx: Transaction): Promise<SparkPoint[]> {
  if (worst === null) return [];
  const byIssue = await trendPoints(product, tx, SPARK_ISSUES);
  return [...byIssue].flatMap(([issue, points]) =>
    points
      .filter(({ operatingPoint }) => operatingPoint === worst.operatingPoint)
      .map((point) => ({ ...point, issue })),
  );
}

import type { LineKind } from "@/lib/vocabulary/lines";
import { canonicalJson } from "./canonical-json";
import { textHash } from "./text-hash";

/** What an issue froze: the revisions and results written with it, and its totals. Texts as stored. */
export interface IssueContent {
  productCode: string;
  number: number;
  totals: string;
  uncertainty: string | null;
  revisions: readonly { kind: LineKind; number: string; letter: string; hash: string }[];
  results: readonly {
    item: string;
    operatingPoint: string;
    methodVersion: number;
    basic: number;
    growthFraction: number;
    growth: number;
    predicted: number;
    notes: string;
    answer: string;
  }[];
}

/** The issue's content hash; the order in which revisions and results are given does not matter. */
export function issueContentHash({
  productCode,
  number,
  totals,
  uncertainty,
  revisions,
  results,
}: IssueContent): string {
  return textHash(
    "issue",
    canonicalJson({
      productCode,
      number,
      totals,
      uncertainty,
      revisions: revisions.map((line) => canonicalJson([line.kind, line.number, line.letter, line.hash])).sort(),
      results: results.map((row) => canonicalJson(resultFields(row))).sort(),
    }),
  );
}

function resultFields(row: IssueContent["results"][number]): unknown[] {
  const { item, operatingPoint, methodVersion, basic, growthFraction, growth, predicted, notes, answer } = row;
  return [item, operatingPoint, methodVersion, basic, growthFraction, growth, predicted, notes, answer];
}

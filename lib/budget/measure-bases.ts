import { QueryTypes, type Transaction } from "sequelize";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { type MeasureBasis, measureBasis } from "@/lib/evaluation/measures/measure-basis";
import type { LineKind } from "@/lib/vocabulary/lines";
import { database } from "@/models/database";
import { type LineRow, type ProductRow, toLineState } from "./load-budget";
import type { StoredPoint } from "./stored-results";

/** What a force at an operating point of an issue is referred to, by the terms and the point of that issue. */
export type BasisAt = (issue: number, point: Pick<StoredPoint, "operatingPoint" | "stream">) => MeasureBasis;

/** The bases of all issues of a product: each issue is read by its own terms, not by today's. */
export async function measureBasesOf({ id, kind }: Pick<ProductRow, "id" | "kind">, tx: Transaction): Promise<BasisAt> {
  const rows = await database.query<LineRow>(
    `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body
     FROM lines l JOIN line_revisions r ON r.line_id = l.id
     WHERE l.product_id = :productId AND l.kind IN ('terms', 'operating_point') ORDER BY r.issue DESC`,
    { type: QueryTypes.SELECT, replacements: { productId: id }, transaction: tx },
  );
  const revisions = rows.map(toLineState);

  return (issue, { operatingPoint, stream }) => {
    const terms = revisionAt(revisions, issue, "terms");
    if (terms?.kind !== "terms") throw new Error(`Issue ${issue} of product ${id} has no terms.`);
    const point = revisionAt(revisions, issue, "operating_point", operatingPoint);
    const hoursPerYear = point?.kind === "operating_point" ? point.body.hoursPerYear : null;
    return measureBasis(kind, terms.body, stream, hoursPerYear);
  };
}

/** Newest first: the first at or before the issue is in force. */
function revisionAt(revisions: readonly LineState[], issue: number, kind: LineKind, number?: string) {
  return revisions.find(
    (line) => line.kind === kind && line.issue <= issue && (number === undefined || line.number === number),
  );
}

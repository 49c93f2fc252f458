import { QueryTypes, type Transaction } from "sequelize";
import { MATURITY_GRADES, type MaturityGrade } from "@/lib/vocabulary/grades";
import { database } from "@/models/database";
import type { EarlierMove } from "@/policies/routing-facts";

const DAY_MS = 86_400_000;

/** What was approved within the window before this moment: per edited item, operating point and issue. */
export async function approvedMoves(
  productId: number,
  at: string,
  windowDays: number,
  tx: Transaction,
): Promise<EarlierMove[]> {
  const since = new Date(Date.parse(at) - windowDays * DAY_MS).toISOString();
  const rows = await database.query<MoveRow>(MOVES, {
    type: QueryTypes.SELECT,
    replacements: { productId, since },
    transaction: tx,
  });
  return rows.map(toMove);
}

interface MoveRow {
  item: string;
  operatingPoint: string;
  issue: number;
  basic: number;
  predicted: number;
  growthFraction: number;
  predictedBefore: number | null;
  growthFractionBefore: number | null;
  grade: MaturityGrade;
  gradeBefore: MaturityGrade | null;
  programManagerSigned: number;
}

function before(column: string): string {
  return `(SELECT ${column} FROM results b WHERE b.item_id = r.item_id
    AND b.operating_point_id = r.operating_point_id AND b.issue < r.issue ORDER BY b.issue DESC LIMIT 1)`;
}

// Only items that the issue's proposal edited: what merely followed has no revision of its own at that issue.
const MOVES = `
  SELECT l.number AS item, o.number AS operatingPoint, r.issue, r.basic, r.predicted,
    r.growth_fraction AS growthFraction, ${before("predicted")} AS predictedBefore,
    ${before("growth_fraction")} AS growthFractionBefore, json_extract(v.body, '$.grade') AS grade,
    (SELECT json_extract(w.body, '$.grade') FROM line_revisions w
      WHERE w.line_id = v.line_id AND w.issue < v.issue ORDER BY w.issue DESC LIMIT 1) AS gradeBefore,
    d.submitted_as = 'program_manager' OR EXISTS (SELECT 1 FROM signatures s
      WHERE s.round_id = d.id AND s.capacity = 'program_manager' AND s.decision = 'approve'
        AND NOT EXISTS (SELECT 1 FROM signatures t WHERE t.takes_back_id = s.id)) AS programManagerSigned
  FROM results r
    JOIN line_revisions v ON v.line_id = r.item_id AND v.issue = r.issue
    JOIN lines l ON l.id = r.item_id
    JOIN lines o ON o.id = r.operating_point_id
    JOIN issues i ON i.product_id = r.product_id AND i.number = r.issue
    JOIN proposals p ON p.id = i.proposal_id
    JOIN rounds d ON d.proposal_id = p.id AND d.number = p.round
  WHERE r.product_id = :productId AND i.made_at >= :since
  ORDER BY r.issue, l.number, o.number`;

function toMove(row: MoveRow): EarlierMove {
  const { item, operatingPoint, issue, basic, predicted, growthFraction } = row;
  const isRaised =
    row.gradeBefore !== null && MATURITY_GRADES.indexOf(row.grade) > MATURITY_GRADES.indexOf(row.gradeBefore);
  const fall = (row.growthFractionBefore ?? growthFraction) - growthFraction;
  return {
    item,
    operatingPoint,
    issue,
    predicted: predicted - (row.predictedBefore ?? 0),
    released: isRaised ? Math.abs(basic) * fall : 0,
    programManagerSigned: Boolean(row.programManagerSigned),
  };
}

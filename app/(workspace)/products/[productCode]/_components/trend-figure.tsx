import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { TrendIssue, TrendPoint } from "@/lib/budget/views";
import type { TermsBody } from "@/lib/evaluation/lines/terms-body";
import { type Reading, readNumber, readText } from "@/lib/evaluation/measures/reading";
import { FIRST_PREFERENCES } from "@/lib/vocabulary/measures";

import { TrendPicture } from "@/app/(workspace)/products/[productCode]/_pictures/trend-picture";

interface TrendFigureProps {
  trend: readonly TrendIssue[];
  operatingPoint: string;
  /** Of the newest terms; drawn at the reference operating point only. */
  planned: TermsBody["plannedProfile"];
  until: string;
  /** Newtons where it isn't said. */
  measure?: Pick<ChosenMeasure, "measure" | "units">;
}

/** The totals at one operating point over the issues. */
export function TrendFigure({ trend, operatingPoint, planned, until, measure = FIRST_PREFERENCES }: TrendFigureProps) {
  const issues = trend.flatMap(({ number, at, points }) => {
    const point = points.find((each) => each.operatingPoint === operatingPoint);
    return point ? [{ issue: number, at, ...point }] : [];
  });
  const newest = issues.at(-1);
  if (!newest) return null;
  const reading = readingFor(measure, newest.basis);
  const read = issues.flatMap((issue) => readAt(issue, reading, measure));
  const [first = newest, last = newest] = [read.at(0), read.at(-1)];
  const print = (newtons: number) => readText(reading, newtons);

  return (
    <FigureWithTable
      summary={
        `Predicted total at ${operatingPoint}: ${print(first.predicted)} at issue ${first.issue}, ` +
        `${print(last.predicted)} at issue ${last.issue}, limit ${print(last.limit)}.`
      }
      picture={
        <TrendPicture
          issues={read}
          planned={planned.map(({ date, predictedHundredths, toleranceHundredths }) => ({
            date,
            predicted: predictedHundredths / 100,
            tolerance: toleranceHundredths / 100,
          }))}
          until={until}
          reading={reading}
        />
      }
      caption={<TrendKey planned={planned.length > 0} reading={reading} leftOut={issues.length - read.length} />}
      table={<TrendTable issues={read} reading={reading} />}
    />
  );
}

/**
 * An issue's forces as those that would read the same by today's basis: each issue is read by its own stream and
 * reference area, and drawn on one scale.
 */
function readAt<Point extends TrendRow & { basis: TrendPoint["basis"] }>(
  point: Point,
  reading: Reading,
  measure: Pick<ChosenMeasure, "measure" | "units">,
): Point[] {
  const own = readingFor(measure, point.basis);
  if (own.measure !== reading.measure) return [];
  const ratio = own.perNewton / reading.perNewton;
  const { basic, predicted, limit, reserve } = point;
  return [
    { ...point, basic: basic * ratio, predicted: predicted * ratio, limit: limit * ratio, reserve: reserve * ratio },
  ];
}

interface TrendKeyProps {
  planned: boolean;
  reading: Reading;
  /** Issues that had no reference area, or whatever the measure needs. */
  leftOut: number;
}

function TrendKey({ planned, reading, leftOut }: TrendKeyProps) {
  return (
    <span>
      {reading.unit === "N" ? "Newtons" : `In ${reading.unit || "the coefficient"}, each issue by its own terms`}
      {leftOut > 0 ? ` (${leftOut} without this measure left out)` : ""}. Thick line: predicted, with the number of the
      issue; thin line: basic; solid black: limit; dashed: where the reserve begins
      {planned ? "; dotted in its band: planned profile with tolerance" : ""}.
    </span>
  );
}

interface TrendRow {
  issue: number;
  basic: number;
  predicted: number;
  limit: number;
  reserve: number;
}

function TrendTable({ issues, reading }: { issues: readonly TrendRow[]; reading: Reading }) {
  return (
    <Table caption={`The numbers of the picture${reading.unit ? `, in ${reading.unit}` : ""}`}>
      <TableHead>
        <Head>Issue</Head>
        <Head numeric>Basic</Head>
        <Head numeric>Predicted</Head>
        <Head numeric>Reserve from</Head>
        <Head numeric>Limit</Head>
      </TableHead>
      <tbody>
        {issues.map(({ issue, basic, predicted, limit, reserve }) => (
          <Row key={issue}>
            <RowHead>{issue}</RowHead>
            {[basic, predicted, limit - reserve, limit].map((value, at) => (
              <Cell key={at} numeric>
                {readNumber(reading, value)}
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

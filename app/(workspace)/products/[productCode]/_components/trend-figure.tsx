import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { TrendIssue } from "@/lib/budget/views";
import type { TermsBody } from "@/lib/evaluation/lines/terms-body";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { TrendPicture } from "@/app/(workspace)/products/[productCode]/_pictures/trend-picture";

interface TrendFigureProps {
  trend: readonly TrendIssue[];
  operatingPoint: string;
  /** Of the newest terms; drawn at the reference operating point only. */
  planned: TermsBody["plannedProfile"];
  until: string;
}

/** The totals at one operating point over the issues. */
export function TrendFigure({ trend, operatingPoint, planned, until }: TrendFigureProps) {
  const issues = trend.flatMap(({ number, at, points }) => {
    const point = points.find((each) => each.operatingPoint === operatingPoint);
    return point ? [{ issue: number, at, ...point }] : [];
  });
  const [first, last] = [issues.at(0), issues.at(-1)];
  if (!first || !last) return null;

  return (
    <FigureWithTable
      summary={
        `Predicted total at ${operatingPoint}: ${formatNewtons(first.predicted)} at issue ${first.issue}, ` +
        `${formatNewtons(last.predicted)} at issue ${last.issue}, limit ${formatNewtons(last.limit)}.`
      }
      picture={
        <TrendPicture
          issues={issues}
          planned={planned.map(({ date, predictedHundredths, toleranceHundredths }) => ({
            date,
            predicted: predictedHundredths / 100,
            tolerance: toleranceHundredths / 100,
          }))}
          until={until}
        />
      }
      caption={<TrendKey planned={planned.length > 0} />}
      table={<TrendTable issues={issues} />}
    />
  );
}

function TrendKey({ planned }: { planned: boolean }) {
  return (
    <span>
      Newtons. Thick line: predicted, with the number of the issue; thin line: basic; solid black: limit; dashed: where
      the reserve begins{planned ? "; dotted in its band: planned profile with tolerance" : ""}.
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

function TrendTable({ issues }: { issues: readonly TrendRow[] }) {
  return (
    <Table caption="The numbers of the picture, in newtons">
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
                {formatNewtonsNumber(value)}
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

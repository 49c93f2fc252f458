import type { Route } from "next";
import Link from "next/link";

import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { IssueFacts, TrendIssue } from "@/lib/budget/views";
import { readText } from "@/lib/evaluation/measures/reading";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

import { approvedBy, proposedBy } from "@/app/(workspace)/products/[productCode]/_components/sheet-fields";

interface IssuesTableProps {
  issues: readonly IssueFacts[];
  trend: readonly TrendIssue[];
  operatingPoint: string;
  productCode: string;
  measure: ChosenMeasure;
}

/** Every issue, newest first: what made it, who signed, and where the total stood. */
export function IssuesTable({ issues, trend, operatingPoint, productCode, measure }: IssuesTableProps) {
  const totals = new Map(trend.map(({ number, points }) => [number, points]));
  const newest = trend.at(-1)?.points.find((each) => each.operatingPoint === operatingPoint);
  const newestBasis = newest ? readingFor(measure, newest.basis).basis : null;

  return (
    <Table caption={`Issues, with totals at ${operatingPoint}`} narrow="stack">
      <TableHead>
        <Head>Issue</Head>
        <Head>Issued</Head>
        <Head>By proposal</Head>
        <Head>Proposed, approved</Head>
        <Head numeric>Predicted</Head>
        <Head numeric>To limit</Head>
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {issues.toReversed().map((issue) => {
          const point = totals.get(issue.number)?.find((each) => each.operatingPoint === operatingPoint);
          // By the terms of its own issue: what stood then is not read by what holds now.
          const reading = point ? readingFor(measure, point.basis) : null;
          const print = (newtons: number) => (reading ? readText(reading, newtons) : "–");
          return (
            <Row key={issue.number} data-issue={issue.number}>
              <RowHead label="Issue">
                <Link className="link" href={`/products/${productCode}/budget?issue=${issue.number}` as Route}>
                  Issue {issue.number}
                </Link>
                {issue.baselines.map(({ name }) => (
                  <span key={name} className="block text-xs">
                    baseline {name}
                  </span>
                ))}
                <span className="block font-code text-2xs text-ink-2" title={issue.contentHash}>
                  {issue.contentHash.slice(0, 12)}
                </span>
                <Link
                  className="link text-xs print:hidden"
                  href={`/products/${productCode}/issues/${issue.number}/recomputed?point=${operatingPoint}` as Route}
                >
                  Recompute<span className="sr-only"> issue {issue.number}</span>
                </Link>
              </RowHead>
              <Cell label="Issued">
                <UtcTime at={issue.at} />
              </Cell>
              <Cell label="By proposal" className="sm:min-w-44">
                {issue.proposal ? (
                  <Link className="link" href={`/products/${productCode}/proposals/${issue.proposal.number}` as Route}>
                    {issue.proposal.label} {issue.proposal.title}
                  </Link>
                ) : (
                  "established"
                )}
              </Cell>
              <Cell label="Proposed, approved">
                {proposedBy(issue)}
                <span className="block text-xs text-ink-2">{approvedBy(issue)}</span>
              </Cell>
              <Cell numeric label="Predicted">
                {point ? print(point.predicted) : "–"}
                {reading && reading.basis !== newestBasis ? (
                  <span className="block text-xs whitespace-normal text-ink-2">{reading.basis}</span>
                ) : null}
              </Cell>
              <Cell numeric label="To limit">
                {point ? print(point.margin) : "–"}
              </Cell>
              <Cell label="Standing" className={point?.standing === "over" ? "font-semibold text-signal" : undefined}>
                {point ? STANDING_NAMES[point.standing] : "no such operating point"}
              </Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}

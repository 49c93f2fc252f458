import type { Route } from "next";
import Link from "next/link";

import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { IssueFacts } from "@/lib/budget/views";

import { MakeBaseline } from "./make-baseline";

interface BaselinesProps {
  productCode: string;
  issues: readonly IssueFacts[];
  maySign: boolean;
}

/** Issues that were given a name and a purpose, latest first; a program manager signs the next one here. */
export function Baselines({ productCode, issues, maySign }: BaselinesProps) {
  const baselines = issues
    .flatMap(({ number, baselines: own }) => own.map((baseline) => ({ ...baseline, issue: number })))
    .toSorted((one, other) => other.at.localeCompare(one.at));

  return (
    <section aria-labelledby="baselines" className="mt-7">
      <SectionHeading id="baselines">Baselines</SectionHeading>
      {baselines.length === 0 ? (
        <p className="border-t border-ink py-2.5 text-ink-2">
          No issue has been named a baseline. A program manager signs one, for example before a design review.
        </p>
      ) : (
        <Table caption="Baselines, latest first" narrow="stack">
          <TableHead>
            <Head>Baseline</Head>
            <Head>Issue</Head>
            <Head className="w-[40%]">Purpose</Head>
            <Head>Signed by</Head>
            <Head>Signed</Head>
          </TableHead>
          <tbody>
            {baselines.map((baseline) => (
              <Row key={baseline.name}>
                <RowHead label="Baseline" className="font-semibold">
                  {baseline.name}
                </RowHead>
                <Cell label="Issue">
                  <Link className="link" href={`/products/${productCode}/budget?issue=${baseline.issue}` as Route}>
                    Issue {baseline.issue}
                  </Link>
                </Cell>
                <Cell label="Purpose">{baseline.purpose}</Cell>
                <Cell label="Signed by">{baseline.signedBy}</Cell>
                <Cell label="Signed">
                  <UtcTime at={baseline.at} />
                </Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      )}
      {maySign ? (
        <div className="mt-3">
          <MakeBaseline productCode={productCode} numbers={issues.map(({ number }) => number)} />
        </div>
      ) : null}
    </section>
  );
}

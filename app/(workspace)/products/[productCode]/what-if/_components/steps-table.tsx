import type { Route } from "next";
import Link from "next/link";

import { NoteMark } from "@/app/_components/note-mark";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { JointStep } from "@/lib/proposals/review/joint-change";

interface StepsTableProps {
  steps: readonly JointStep[];
  productCode: string;
}

/** The set in its order: which issue each would make, and what stands in the way of those that would make none. */
export function StepsTable({ steps, productCode }: StepsTableProps) {
  const left = steps.filter(({ issue }) => issue === null).length;

  return (
    <section className="mt-7">
      <SectionHeading aside={left === 0 ? "no conflict" : `${left} left out`}>Approved in this order</SectionHeading>
      <Table caption="The set in the order of its numbers" narrow="stack">
        <TableHead>
          <Head className="w-[18%]">Proposal</Head>
          <Head className="w-[14%]">Would make</Head>
          <Head>What stands in the way</Head>
        </TableHead>
        <tbody>
          {steps.map((step) => (
            <Row key={step.key}>
              <RowHead label="Proposal">
                <Link href={`/products/${productCode}/proposals/${step.key}` as Route} className="link font-medium">
                  {step.label}
                </Link>
              </RowHead>
              <Cell label="Would make">{step.issue === null ? "left out" : `issue ${step.issue}`}</Cell>
              <Cell label="In the way">
                <Obstacles step={step} />
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      {left === 0 ? null : (
        <p className="mt-2 max-w-[70ch] text-sm text-ink-2">
          What is left out does not count in any figure here: somebody has to settle it first.
        </p>
      )}
    </section>
  );
}

function Obstacles({ step: { conflicts, carried, missing } }: { step: JointStep }) {
  if (conflicts.length + carried.length + missing.length === 0) return <>nothing</>;

  return (
    <>
      {conflicts.map((sentence) => (
        <NoteMark key={sentence} severity="refusal">
          {sentence}
        </NoteMark>
      ))}
      {carried.length > 0 ? (
        <NoteMark severity="caution">
          Overtaken: it has to be carried forward, where nothing needs settling. {carried.join(" ")}
        </NoteMark>
      ) : null}
      {missing.map((sentence) => (
        <NoteMark key={sentence} severity="information">
          Still to be said: {sentence}
        </NoteMark>
      ))}
    </>
  );
}

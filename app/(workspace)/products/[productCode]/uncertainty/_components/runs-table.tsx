import type { ReactNode } from "react";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { RunView } from "@/lib/budget/monte-carlo/runs-of";
import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { formatExact } from "@/lib/units/format-number";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";
import { RepeatRun } from "./repeat-run";
import { RUN_FIGURES } from "./run-figures";

interface RunsTableProps {
  frozen: PointUncertainty;
  runs: readonly RunView[];
  issue: number;
  productCode: string;
}

/** First order as it was frozen, and under it every kept run with what it differs by. */
export function RunsTable({ frozen, runs, issue, productCode }: RunsTableProps) {
  return (
    <Table caption="First order and Monte Carlo runs" narrow="stack">
      <TableHead>
        <Head>How</Head>
        {RUN_FIGURES.map(({ heading, unit }) => (
          <Head key={heading} numeric unit={unit}>
            {heading}
          </Head>
        ))}
        <Head>Kept</Head>
      </TableHead>
      <tbody>
        <Row band>
          <RowHead label="How">First order</RowHead>
          {RUN_FIGURES.map(({ heading, short, figure, ofFirstOrder, print }) => (
            <Cell key={heading} numeric label={short}>
              <WorkingNumber figure={figure} of="total" number={null} name={`${heading}, first order`}>
                {print(ofFirstOrder(frozen))}
              </WorkingNumber>
            </Cell>
          ))}
          <Cell label="Kept" className="font-normal">
            frozen with issue {issue}
          </Cell>
        </Row>
        {runs.map((run) => (
          <RunRow key={run.id} run={run} frozen={frozen} productCode={productCode} />
        ))}
        {runs.length === 0 ? <NoRuns /> : null}
      </tbody>
    </Table>
  );
}

function RunRow({ run, frozen, productCode }: { run: RunView; frozen: PointUncertainty; productCode: string }) {
  const how = `${formatExact(run.draws)} draws, seed ${run.seed}`;

  return (
    <Row data-run={run.id}>
      <RowHead label="How">
        Monte Carlo
        <span className="block text-xs text-ink-2">{how}</span>
      </RowHead>
      {RUN_FIGURES.map(({ heading, short, ofFirstOrder, ofRun, print, difference }) => (
        <Cell key={heading} numeric label={short}>
          <WorkingNumber figure="interval" of="run" number={String(run.id)} name={`${heading}, ${how}`}>
            {print(ofRun(run.result))}
          </WorkingNumber>
          <Small>{difference(ofRun(run.result), ofFirstOrder(frozen))}</Small>
        </Cell>
      ))}
      <Cell label="Kept">
        {run.by}
        <Small>
          <UtcTime at={run.at} />
        </Small>
        <span className="block font-code text-2xs text-ink-2" title={`Input ${run.inputHash}`}>
          input {run.inputHash.slice(0, 12)}
        </span>
        <RepeatRun productCode={productCode} runId={run.id} draws={run.draws} />
      </Cell>
    </Row>
  );
}

function Small({ children }: { children: ReactNode }) {
  return <span className="block text-xs text-ink-2">{children}</span>;
}

function NoRuns() {
  return (
    <Row>
      <Cell colSpan={RUN_FIGURES.length + 2} className="text-ink-2 max-sm:block!">
        No run of this issue at this operating point yet. First order takes every slope as straight and the sum as
        normal; a run shows how far that holds.
      </Cell>
    </Row>
  );
}

import type { Route } from "next";
import Link from "next/link";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { dayText } from "@/app/_components/utc-text";
import type { ProposalListRow } from "@/lib/proposals/workspace-views";
import { formatNewtonsChange } from "@/lib/units/format-newtons";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

import { stateWords } from "./state-words";

interface ProposalsTableProps {
  caption: string;
  productCode: string;
  rows: readonly ProposalListRow[];
}

/** Change proposals in a table: what each is, where it stands and for whom it waits. */
export function ProposalsTable({ caption, productCode, rows }: ProposalsTableProps) {
  return (
    <Table caption={caption} narrow="stack">
      <TableHead>
        <Head className="w-[32%]">Proposal</Head>
        <Head className="w-[13%]">By</Head>
        <Head className="w-[13%]">State</Head>
        <Head className="w-[18%]">Waits for</Head>
        <Head className="w-[11%]">Needed by</Head>
        <Head numeric>Effect on predicted</Head>
      </TableHead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.proposalId}>
            <RowHead label="Proposal">
              <Link
                href={`/products/${productCode}/proposals/${row.key}${row.state === "draft" ? "/edit" : ""}` as Route}
                className="link font-medium"
              >
                {row.label}
              </Link>{" "}
              <span>{row.title}</span>
              <span className="block text-sm text-ink-2">{linesText(row)}</span>
            </RowHead>
            <Cell label="By">{row.proposer.name}</Cell>
            <Cell label="State">
              <StateCell row={row} />
            </Cell>
            <Cell label="Waits for">
              <WaitsFor row={row} />
            </Cell>
            <Cell label="Needed by">
              {row.neededBy ? <span className="whitespace-nowrap">{dayText(row.neededBy)}</span> : "–"}
            </Cell>
            <Cell label="Effect" numeric>
              <EffectCell effect={row.effect} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function linesText({ lines }: ProposalListRow): string {
  const shown = lines.slice(0, 3).map(({ number, name }) => `${number} ${name}`);
  const rest = lines.length - shown.length;

  return rest > 0 ? `${shown.join(", ")} and ${rest} more` : shown.join(", ");
}

function StateCell({ row }: { row: ProposalListRow }) {
  return (
    <>
      {stateWords(row.state, row.round)}
      {row.overtaken.length > 0 ? <span className="block text-sm font-medium">overtaken</span> : null}
      {row.unsettledRequests > 0 ? (
        <span className="block text-sm text-ink-2">
          {row.unsettledRequests === 1 ? "1 request for action" : `${row.unsettledRequests} requests for action`}
        </span>
      ) : null}
    </>
  );
}

function WaitsFor({ row }: { row: ProposalListRow }) {
  if (row.waitingFor.length === 0) return <>–</>;

  return row.waitingFor.map(({ capacity, names }) => (
    <span key={capacity} className="block">
      {ROLE_NAMES[capacity]}
      <span className="block text-sm text-ink-2">{names.length > 0 ? names.join(", ") : "nobody who may sign"}</span>
    </span>
  ));
}

function EffectCell({ effect }: { effect: ProposalListRow["effect"] }) {
  if (!effect) return <>–</>;
  const moved = effect.standingWas !== effect.standingNow;

  return (
    <>
      {formatNewtonsChange(effect.predictedDelta)}
      <span className="block text-sm text-ink-2">
        {effect.operatingPoint}
        {moved ? `, ${STANDING_NAMES[effect.standingWas]} → ${STANDING_NAMES[effect.standingNow]}` : ""}
      </span>
    </>
  );
}

"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useOptimistic, useTransition } from "react";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { type Reading, readChangeNumber } from "@/lib/evaluation/measures/reading";
import type { WhatIfCandidate } from "@/lib/proposals/reading/what-if";

import { tickedAfter, whatIfAddress } from "./ticked-keys";

interface TickTableProps {
  path: string;
  candidates: readonly WhatIfCandidate[];
  worstPoint: string;
  /** Of the worst operating point, as it stands today. */
  reading: Reading;
  /** That the address asks for. */
  measure: string | undefined;
}

/** What may be ticked. The ticks stand in the address, so that a set can be sent to somebody. */
export function TickTable({ path, candidates, worstPoint, reading, measure }: TickTableProps) {
  const router = useRouter();
  const [isPending, startTransition] = useTransition();
  const [ticked, showTicked] = useOptimistic(candidates.filter(({ isTicked }) => isTicked).map(({ key }) => key));

  function tick(key: string, isTicked: boolean) {
    const keys = tickedAfter(
      candidates.map((each) => each.key),
      ticked,
      key,
      isTicked,
    );
    startTransition(() => {
      showTicked(keys);
      router.replace(whatIfAddress(path, keys, measure) as Route, { scroll: false });
    });
  }

  return (
    <div aria-busy={isPending}>
      <Table caption="Proposals and drafts that may be approved together, in this order" showCaption narrow="stack">
        <TableHead>
          <Head className="w-[52%]">Proposal</Head>
          <Head>By</Head>
          <Head>State</Head>
          <Head numeric unit={reading.unit}>
            Alone, at {worstPoint}
          </Head>
        </TableHead>
        <tbody>
          {candidates.map((candidate) => (
            <Row key={candidate.key}>
              <RowHead label="Proposal">
                <label className="flex min-h-7 items-baseline gap-2.5">
                  <input
                    type="checkbox"
                    checked={ticked.includes(candidate.key)}
                    onChange={(event) => tick(candidate.key, event.target.checked)}
                    className="size-4 shrink-0 translate-y-0.5 accent-ink"
                  />
                  <span>
                    <span className="font-medium">{candidate.label}</span> {candidate.title}
                  </span>
                </label>
              </RowHead>
              <Cell label="By">{candidate.proposer.name}</Cell>
              <Cell label="State">{candidate.state}</Cell>
              <Cell numeric label="Alone">
                {candidate.predictedDelta === null ? "–" : readChangeNumber(reading, candidate.predictedDelta)}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      <p role="status" className="min-h-5 text-sm text-ink-2">
        {isPending ? "Computing…" : ""}
      </p>
    </div>
  );
}

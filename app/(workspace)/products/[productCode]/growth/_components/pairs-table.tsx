import type { Route } from "next";
import Link from "next/link";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { type EstimateAndTest, growthOf } from "@/lib/evaluation/budget/estimate-to-test";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";

import { growthText } from "./growth-text";

/** Every estimate that a test replaced, with what the test made of it. */
export function PairsTable({ pairs, base }: { pairs: readonly EstimateAndTest[]; base: string }) {
  return (
    <Table caption="Estimates and the measured values that replaced them" narrow="stack">
      <TableHead>
        <Head>Item</Head>
        <Head>Grade of the estimate</Head>
        <Head>Method</Head>
        <Head numeric unit="N">
          Estimate
        </Head>
        <Head numeric unit="N">
          Measured
        </Head>
        <Head numeric unit="of the estimate">
          Growth
        </Head>
      </TableHead>
      <tbody>
        {pairs.map((pair) => (
          <Row key={`${pair.item} ${pair.grade}`}>
            <RowHead label="Item">
              <Link className="link" href={`${base}/items/${pair.item}` as Route}>
                {pair.item} {pair.name}
              </Link>
            </RowHead>
            <Cell label="Grade of the estimate">
              {MATURITY_GRADE_NAMES[pair.grade]}, issue {pair.estimateIssue}
            </Cell>
            <Cell label="Method">{ITEM_METHODS[pair.method].label}</Cell>
            <Cell numeric label="Estimate, N">
              {formatNewtonsNumber(pair.estimate)}
            </Cell>
            <Cell numeric label="Measured, N">
              {formatNewtonsNumber(pair.measured)}
              <span className="block text-xs text-ink-2">issue {pair.measuredIssue}</span>
            </Cell>
            <Cell numeric label="Growth, of the estimate">
              {growthText(growthOf(pair))}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

"use client";

import { SymbolText } from "@/app/_components/symbol-text";
import { ANSWER_FIELDS } from "@/app/(workspace)/products/[productCode]/_sheet/answer-rows";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { MethodAnswer } from "@/lib/evaluation/methods/method-answer";
import { formatNewtons } from "@/lib/units/format-newtons";

import { dragOf, newtonsFrom, percentFrom } from "../_trial/difference";
import type { TrialReading } from "../_trial/read-setting";

interface ComparisonTableProps {
  a: TrialReading;
  b: TrialReading;
}

/** Drag and everything else that the methods give, A and B side by side. */
export function ComparisonTable({ a, b }: ComparisonTableProps) {
  const drags = { a: dragOf(a), b: dragOf(b) };
  const newtons = newtonsFrom(drags.a, drags.b);
  const percent = percentFrom(drags.a, drags.b);
  const rows = ANSWER_FIELDS.map(({ name, symbol, text }) => ({
    name,
    symbol,
    texts: [answerOf(a), answerOf(b)].map((answer) => (answer ? text(answer, "si") : null)),
  })).filter(({ texts }) => texts.some((text) => text !== null));

  return (
    <>
      <p role="status" className="mb-2 text-lg font-semibold" data-testid="trial-difference">
        {newtons === null ? "No difference to tell until both settings give a drag." : `From A to B ${newtons}`}
        {percent === null ? "" : `, ${percent} of A`}
      </p>
      <Table caption="What the two settings give" narrow="stack">
        <TableHead>
          <Head>Quantity</Head>
          <Head numeric>A</Head>
          <Head numeric>B</Head>
          <Head numeric>From A to B</Head>
        </TableHead>
        <tbody>
          <Row band>
            <RowHead label="Quantity">
              Drag <SymbolText symbol="D" />
            </RowHead>
            <Cell numeric label="A">
              {dragText(a, drags.a)}
            </Cell>
            <Cell numeric label="B">
              {dragText(b, drags.b)}
            </Cell>
            <Cell numeric label="From A to B">
              {newtons === null ? "–" : [newtons, percent].filter(Boolean).join(" · ")}
            </Cell>
          </Row>
          {rows.map(({ name, symbol, texts: [textA, textB] }) => (
            <Row key={name}>
              <RowHead label="Quantity">
                {name} <SymbolText symbol={symbol} />
              </RowHead>
              <Cell numeric label="A">
                {textA ?? "–"}
              </Cell>
              <Cell numeric label="B">
                {textB ?? "–"}
              </Cell>
              <Cell numeric label="From A to B">
                {textA === textB ? "same" : ""}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </>
  );
}

function answerOf({ result }: TrialReading): MethodAnswer | null {
  return result?.outcome.outcome === "answer" ? result.outcome.answer : null;
}

function dragText({ result }: TrialReading, drag: number | null): string {
  if (drag !== null) return formatNewtons(drag);
  return result ? "refused" : "–";
}

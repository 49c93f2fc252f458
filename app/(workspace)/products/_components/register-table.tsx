import type { Route } from "next";
import Link from "next/link";

import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { isKept, readNumber, readText } from "@/lib/evaluation/measures/reading";
import { formatNewtons } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";
import { toHundredths } from "@/lib/units/rounding";
import { PRODUCT_KIND_NAMES } from "@/lib/vocabulary/lines";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";

import {
  registerAddress,
  type RegisterQuery,
  type RegisterRow,
  type RegisterSort,
  shareOfLimit,
} from "../_register/register-rows";
import { SparkLine } from "./spark-line";

interface RegisterTableProps {
  rows: readonly RegisterRow[];
  query: RegisterQuery;
  measure: ChosenMeasure;
}

/** All products that the reader may see: standing, margins, trend and what is pending. */
export function RegisterTable({ rows, query, measure }: RegisterTableProps) {
  return (
    <Table caption="Products, each at the operating point where it stands worst" narrow="stack">
      <TableHead>
        <Head {...sorting("code", query)}>Product</Head>
        <Head numeric>Issue</Head>
        <Head {...sorting("standing", query)}>Standing</Head>
        <Head numeric>Predicted, limit</Head>
        <Head numeric {...sorting("margin", query)}>
          Margin to the limit
        </Head>
        <Head numeric {...sorting("share", query)}>
          Of the limit
        </Head>
        <Head>Over the issues</Head>
        <Head numeric {...sorting("pending", query)}>
          Pending
        </Head>
      </TableHead>
      <tbody>
        {rows.map((row) => (
          <ProductRow key={row.product.code} row={row} measure={measure} />
        ))}
      </tbody>
    </Table>
  );
}

/** First up, then down, then by code again. */
function sorting(key: RegisterSort, query: RegisterQuery) {
  const isSorted = query.sort === key;
  const isDown = query.down !== undefined;
  const next: Partial<RegisterQuery> =
    isSorted && isDown ? { sort: "code", down: undefined } : { sort: key, down: isSorted ? "1" : undefined };
  return {
    sortHref: registerAddress(query, next),
    sorted: isSorted ? (isDown ? ("descending" as const) : ("ascending" as const)) : undefined,
  };
}

function ProductRow({ row, measure }: { row: RegisterRow; measure: ChosenMeasure }) {
  const { product, roles, worst, trend } = row;

  return (
    <Row data-product={product.code}>
      <RowHead label="Product">
        <Link className="link font-medium" href={`/products/${product.code}` as Route}>
          {product.code}
        </Link>{" "}
        {product.name}
        <span className="block text-xs text-ink-2">
          {PRODUCT_KIND_NAMES[product.kind]} ·{" "}
          {roles.length > 0 ? roles.map((role) => ROLE_NAMES[role].toLowerCase()).join(", ") : "no role of yours"}
        </span>
      </RowHead>
      <Cell numeric label="Issue">
        {product.newestIssue ?? "not established"}
      </Cell>
      {worst ? <FigureCells row={row} worst={worst} measure={measure} /> : <NoFigures />}
      <Cell label="Over the issues">
        <SparkLine trend={trend} measure={measure} />
      </Cell>
      <Cell numeric label="Pending">
        <Pending row={row} />
      </Cell>
    </Row>
  );
}

interface FigureCellsProps {
  row: RegisterRow;
  worst: NonNullable<RegisterRow["worst"]>;
  measure: ChosenMeasure;
}

function FigureCells({ row, worst, measure }: FigureCellsProps) {
  const basis = row.trend.at(-1)?.basis;
  if (!basis) return <NoFigures />;
  const reading = readingFor(measure, basis);
  const print = (newtons: number) => readText(reading, newtons);
  const { standing, predicted, limit, reserve, margin } = worst;
  const share = shareOfLimit(row) ?? 0;
  const emphasis = standing === "over" ? "font-semibold text-signal" : "";

  return (
    <>
      <Cell label="Standing" className="lg:max-w-56">
        <span className={emphasis}>
          {standingSentence({ standing, totals: { margin }, reserveHundredths: toHundredths(reserve) }, print)}
        </span>
        <span className="block text-xs text-ink-2">
          at {worst.operatingPoint} {worst.name}
        </span>
        {reading.basis ? <span className="block text-xs text-ink-2">{reading.basis}</span> : null}
      </Cell>
      <Cell numeric label="Predicted, limit">
        {print(predicted)}
        <span className="block text-xs text-ink-2">of {print(limit)}</span>
      </Cell>
      <Cell numeric label="Margin to the limit" className={emphasis}>
        {print(margin)}
        {isKept(reading) ? null : <span className="block text-xs text-ink-2">{formatNewtons(margin)}</span>}
        <span className="block text-xs font-normal text-ink-2">reserve {readNumber(reading, reserve)}</span>
      </Cell>
      <Cell numeric label="Of the limit" className={emphasis}>
        {formatPercent(share, Math.abs(share) < 0.001 ? 2 : 1)}
      </Cell>
    </>
  );
}

function NoFigures() {
  return (
    <>
      <Cell label="Standing">–</Cell>
      <Cell numeric label="Predicted, limit">
        –
      </Cell>
      <Cell numeric label="Margin to the limit">
        –
      </Cell>
      <Cell numeric label="Of the limit">
        –
      </Cell>
    </>
  );
}

function Pending({ row: { product, worst, openProposals, waiting } }: { row: RegisterRow }) {
  if (worst === null) return <>–</>;
  return (
    <>
      {openProposals === 0 ? (
        "none"
      ) : (
        <Link className="link" href={`/products/${product.code}/proposals` as Route}>
          {openProposals} {openProposals === 1 ? "proposal" : "proposals"}
        </Link>
      )}
      <span className={`block text-xs ${waiting > 0 ? "font-semibold" : "text-ink-2"}`}>
        {waiting === 0 ? "none waits for you" : `${waiting} ${waiting === 1 ? "waits" : "wait"} for you`}
      </span>
    </>
  );
}

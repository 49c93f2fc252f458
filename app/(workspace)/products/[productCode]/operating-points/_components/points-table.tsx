import type { Route } from "next";
import Link from "next/link";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { FLUID_CHOICES } from "@/lib/evaluation/lines/fluids";
import type { OperatingPointBody } from "@/lib/evaluation/lines/operating-point-body";
import { formatHundredths } from "@/lib/units/format-newtons";
import { formatExact, formatPercent, formatSignificant } from "@/lib/units/format-number";
import { formatQuantity } from "@/lib/units/format-quantity";
import type { UnitSystem, UsDimension } from "@/lib/units/us-customary";

import { InUsUnits } from "@/app/(workspace)/products/[productCode]/_components/in-us-units";

/** Derived numbers of a stream are printed to four digits, so that a hand calculation can start from them. */
const DIGITS = 4;

interface PointsTableProps {
  budget: BudgetAt;
  units: UnitSystem;
  budgetHref: (point: string) => string;
}

/** Every operating point: the state as stated, what follows from it, limit, reserve and standing. */
export function PointsTable({ budget, units, budgetHref }: PointsTableProps) {
  const { terms, operatingPoints } = indexState(budget.state);
  const letters = new Map(budget.state.lines.map((line) => [`${line.kind} ${line.number}`, line.letter]));

  return (
    <Table caption="Operating points">
      <TableHead>
        <Head>Operating point</Head>
        <Head>Fluid and its state</Head>
        <Head>Rev</Head>
        {DERIVED.map(({ symbol, unit }) => (
          <Head key={symbol} numeric unit={unit}>
            {symbol}
          </Head>
        ))}
        <Head numeric unit="N">
          Limit
        </Head>
        <Head numeric unit="N">
          Reserve
        </Head>
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {budget.results.points.map((point) => (
          <PointRow
            key={point.operatingPoint}
            point={point}
            body={operatingPoints.get(point.operatingPoint)}
            isReference={terms.referenceOperatingPoint === point.operatingPoint}
            units={units}
            letter={letters.get(`operating_point ${point.operatingPoint}`) ?? "–"}
            href={budgetHref(point.operatingPoint)}
          />
        ))}
      </tbody>
    </Table>
  );
}

const DERIVED: readonly {
  symbol: string;
  unit: string;
  dimension: UsDimension;
  of: (point: PointResult) => number;
}[] = [
  { symbol: "U", unit: "m/s", dimension: "speed", of: ({ stream }) => stream.speed },
  { symbol: "ρ", unit: "kg/m³", dimension: "density", of: ({ stream }) => stream.density },
  { symbol: "μ", unit: "Pa·s", dimension: "viscosity", of: ({ stream }) => stream.dynamicViscosity },
  { symbol: "ν", unit: "m²/s", dimension: "kinematicViscosity", of: ({ stream }) => stream.kinematicViscosity },
  { symbol: "q", unit: "Pa", dimension: "pressure", of: ({ stream }) => stream.dynamicPressure },
];

interface PointRowProps {
  point: PointResult;
  body: OperatingPointBody | undefined;
  isReference: boolean;
  units: UnitSystem;
  letter: string;
  href: string;
}

function PointRow({ point, body, isReference, units, letter, href }: PointRowProps) {
  return (
    <Row data-point={point.operatingPoint}>
      <RowHead>
        <Link href={href as Route} className="hover:underline">
          <span className="mr-1.5 whitespace-nowrap text-ink-2">{point.operatingPoint}</span>
          {point.name}
        </Link>
        {isReference ? <span className="block text-xs text-ink-2">reference</span> : null}
      </RowHead>
      <Cell className="whitespace-nowrap">
        {body
          ? stateText(body, units).map((part) => (
              <span key={part} className="block">
                {part}
              </span>
            ))
          : null}
      </Cell>
      <Cell>
        <RevisionLetter letter={letter} />
      </Cell>
      {DERIVED.map(({ symbol, dimension, of }) => (
        <Cell key={symbol} numeric>
          {formatSignificant(of(point), DIGITS)}
          <InUsUnits value={of(point)} dimension={dimension} units={units} />
        </Cell>
      ))}
      {[point.limitHundredths, point.reserveHundredths].map((hundredths, at) => (
        <Cell key={at} numeric>
          {formatHundredths(hundredths)}
          <InUsUnits value={hundredths / 100} dimension="force" units={units} />
        </Cell>
      ))}
      <Cell className={`whitespace-nowrap ${point.standing === "over" ? "font-semibold text-signal" : ""}`}>
        {standingSentence(point)}
      </Cell>
    </Row>
  );
}

/** "Air", "15 °C", "101 325 Pa". */
function stateText(body: OperatingPointBody, units: UnitSystem): string[] {
  const { staticTemperature, staticPressure, pressureAltitude, relativeHumidity, density, dynamicViscosity } = body;
  return [
    FLUID_CHOICES.find(({ value }) => value === body.fluid)?.label ?? body.fluid,
    ...(staticTemperature ? [formatQuantity(staticTemperature.value, "temperature", units)] : []),
    ...(staticPressure ? [formatQuantity(staticPressure.value, "pressure", units)] : []),
    ...(pressureAltitude ? [`at ${formatQuantity(pressureAltitude.value, "altitude", units)}`] : []),
    ...(relativeHumidity === null ? [] : [`${formatPercent(relativeHumidity)} relative humidity`]),
    ...(density ? [`ρ ${formatQuantity(density.value, "density", units)}`] : []),
    ...(dynamicViscosity ? [`μ ${formatQuantity(dynamicViscosity.value, "viscosity", units)}`] : []),
    ...(body.hoursPerYear === null ? [] : [`${formatExact(body.hoursPerYear)} hours a year`]),
  ];
}

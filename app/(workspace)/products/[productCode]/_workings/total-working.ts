import { formatHundredths, formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";

import type { BudgetSheet, GroupRow, ItemRow } from "../_sheet/budget-sheet";
import { step } from "./item-working";
import type { Figure, Working, WorkingTerm } from "./working";

type Summed = "basic" | "growth" | "predicted";

const SUM_NAMES: Record<Summed, { title: string; symbol: string }> = {
  basic: { title: "Basic estimate", symbol: "ΣB" },
  growth: { title: "Growth allowance", symbol: "ΣG" },
  predicted: { title: "Predicted", symbol: "ΣP" },
};

/** A sum of the sheet, written out. */
export function totalWorking(sheet: BudgetSheet, figure: Summed): Working {
  const { title, symbol } = SUM_NAMES[figure];
  return sumWorking(`${title}, all items`, symbol, figure, itemsOf(sheet), sheet, sheet.point.totals[figure]);
}

export function groupWorking(sheet: BudgetSheet, group: GroupRow, figure: Summed): Working {
  const { title, symbol } = SUM_NAMES[figure];
  const members = itemsOf(sheet).filter(({ number }) => group.members.includes(number));
  return sumWorking(`${title} of ${group.number} ${group.name}`, symbol, figure, members, sheet, group[figure]);
}

/** The predicted total as it would be if no saving came true. */
export function withoutSavingsWorking(sheet: BudgetSheet): Working {
  const items = itemsOf(sheet).filter(({ body }) => !body.saving);
  const title = "Predicted, without savings";
  return sumWorking(title, "ΣP", "predicted", items, sheet, sheet.point.totals.predictedWithoutSavings);
}

/** What is measured against the limit: margin, clear of the reserve, limit, reserve, unallocated. */
export function limitWorking(sheet: BudgetSheet, figure: Figure): Working {
  switch (figure) {
    case "margin":
      return marginWorking(sheet);
    case "clearOfReserve":
      return clearWorking(sheet);
    case "reserve":
      return reserveWorking(sheet);
    case "unallocated":
      return unallocatedWorking(sheet);
    default:
      return limitItself(sheet);
  }
}

function itemsOf({ rows }: BudgetSheet): ItemRow[] {
  return rows.filter((row) => row.kind === "item");
}

function sumWorking(
  name: string,
  symbol: string,
  figure: Summed,
  items: readonly ItemRow[],
  { point }: BudgetSheet,
  value: number,
): Working {
  const counted = items.filter(({ result }) => result.refused === null);
  const refused = items.filter(({ result }) => result.refused !== null);

  return {
    ...emptyWorking(`${name} at ${point.operatingPoint} ${point.name}`),
    answer: formatNewtons(value),
    terms: [
      ...counted.map((row): WorkingTerm => ({
        label: `${row.number} ${row.name}`,
        value: formatNewtonsNumber(row[figure]),
      })),
      { label: symbol, value: formatNewtonsNumber(value) },
    ],
    sentences: [
      "Summed in full precision and rounded once: the last digit of printed parts may differ from it by one.",
      ...refused.map(({ number, name: item }) => `${number} ${item} is refused and counts in no total.`),
    ],
  };
}

function marginWorking({ point }: BudgetSheet): Working {
  const { limitHundredths, totals } = point;
  const margin = formatNewtonsNumber(totals.margin);
  const share =
    limitHundredths === 0 ? [] : [`${formatPercent(totals.margin / (limitHundredths / 100), 1)} of the limit.`];
  return {
    ...emptyWorking(`Margin to the limit at ${point.operatingPoint} ${point.name}`),
    answer: formatNewtons(totals.margin),
    steps: [
      step({
        quantity: "Margin to the limit",
        symbol: "M",
        formula: "M = limit − ΣP",
        withValues: `${formatHundredths(limitHundredths)} − ${formatNewtonsNumber(totals.predicted)}`,
        value: margin,
      }),
    ],
    sentences: share,
  };
}

function clearWorking({ point }: BudgetSheet): Working {
  const { reserveHundredths, totals } = point;
  return {
    ...emptyWorking(`Clear of the reserve at ${point.operatingPoint} ${point.name}`),
    answer: formatNewtons(totals.clearOfReserve),
    steps: [
      step({
        quantity: "Clear of the reserve",
        symbol: "M − reserve",
        formula: "M − reserve",
        withValues: `${formatNewtonsNumber(totals.margin)} − ${formatHundredths(reserveHundredths)}`,
        value: formatNewtonsNumber(totals.clearOfReserve),
      }),
    ],
    sentences: [
      "Inside: at least the reserve is left. Into the reserve: less than that, but nothing beyond the limit. Over: beyond the limit. Decided on values rounded to 0.01 N.",
    ],
  };
}

function limitItself({ point, indexed }: BudgetSheet): Working {
  const own = indexed.operatingPoints.get(point.operatingPoint)?.limitHundredths ?? null;
  const reference = indexed.terms.referenceOperatingPoint;
  return {
    ...emptyWorking(`Limit at ${point.operatingPoint} ${point.name}`),
    answer: `${formatHundredths(point.limitHundredths)} N`,
    sentences: [
      own === null
        ? `${point.operatingPoint} states no limit of its own: that of the reference operating point ${reference} holds.`
        : `Stated at the operating point ${point.operatingPoint}. It changes by proposal only, signed by a program manager too.`,
    ],
    links: [{ path: "operating-points", label: "Operating points" }],
  };
}

function reserveWorking(sheet: BudgetSheet): Working {
  const { point, indexed, budget } = sheet;
  const { terms } = indexed;
  const given = terms.reserves.find(({ operatingPoint }) => operatingPoint === point.operatingPoint);
  const base = {
    ...emptyWorking(`Reserve at ${point.operatingPoint} ${point.name}`),
    answer: `${formatHundredths(point.reserveHundredths)} N`,
  };
  const reference = budget.results.points.find(
    ({ operatingPoint }) => operatingPoint === terms.referenceOperatingPoint,
  );
  if (given || !reference)
    return { ...base, sentences: ["Stated in the terms: the part of the limit that is held back."] };

  return {
    ...base,
    steps: [
      step({
        quantity: "Reserve",
        symbol: "reserve",
        formula: `reserve at ${reference.operatingPoint} · limit here / limit at ${reference.operatingPoint}`,
        withValues: `${formatHundredths(reference.reserveHundredths)} · ${formatHundredths(point.limitHundredths)} / ${formatHundredths(reference.limitHundredths)}`,
        value: formatHundredths(point.reserveHundredths),
      }),
    ],
    sentences: ["The terms state none for this operating point, so it scales with the limit."],
  };
}

function unallocatedWorking({ budget }: BudgetSheet): Working {
  const sums = budget.allocations;
  const { allocatedHundredths: allocated, reserveHundredths: reserve, limitHundredths: limit } = sums;

  return {
    ...emptyWorking("Unallocated"),
    answer: `${formatHundredths(sums.unallocatedHundredths)} N`,
    terms: [
      { label: `Limit at ${sums.operatingPoint}`, value: formatHundredths(limit) },
      { label: "less reserve", value: formatHundredths(-reserve) },
      { label: "less allocations", value: formatHundredths(-allocated) },
      { label: "Unallocated", value: formatHundredths(limit - reserve - allocated) },
    ],
    sentences: [
      "Stored on the allocations sheet and checked against this sum after every act. A group's allocation is a ceiling: what its members hold counts inside it, not beside it.",
    ],
  };
}

export function emptyWorking(title: string): Working {
  return { title, answer: null, steps: [], terms: [], sentences: [], notes: [], links: [] };
}

import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import type { LineKind, ProductKind } from "@/lib/vocabulary/lines";

interface StateSketch {
  code: string;
  name: string;
  kind: ProductKind;
  point: object;
  otherPoints?: Record<string, object>;
  limitHundredths: number;
  reserveHundredths: number;
  terms?: object;
  groups?: Record<string, object>;
  finishes?: Record<string, object>;
  items: Record<string, object>;
  allocations?: { kind: "item" | "group"; number: string; hundredths: number }[];
  unallocatedHundredths?: number;
}

/** A budget at issue 1 with every line at its first letter; a body that does not parse fails the test. */
export function budgetState(sketch: StateSketch): BudgetState {
  const { limitHundredths, reserveHundredths, allocations = [] } = sketch;
  const held = allocations.reduce((sum, row) => sum + row.hundredths, 0);
  const unallocatedHundredths = sketch.unallocatedHundredths ?? limitHundredths - reserveHundredths - held;
  return {
    product: { code: sketch.code, name: sketch.name, kind: sketch.kind },
    lines: [
      line("operating_point", "OP-1", { name: "OP-1", limitHundredths, ...sketch.point }),
      ...linesOf("operating_point", sketch.otherPoints),
      line("terms", "TM", { ...termsSketch(reserveHundredths), ...sketch.terms }),
      line("allocations", "AL", { rows: allocations, unallocatedHundredths }),
      ...linesOf("group", sketch.groups),
      ...linesOf("finish", sketch.finishes),
      ...linesOf("item", sketch.items),
    ],
  };
}

/** A line at its first letter; later lines of a test are made by edits. */
export function line(kind: LineKind, number: string, body: object): LineState {
  const parsed = parseBody(kind, body);
  if (!parsed.ok) throw new Error(`${kind} ${number}: ${JSON.stringify(parsed.faults)}`);
  return { number, letter: "–", issue: 1, retired: false, ...parsed.content };
}

function linesOf(kind: LineKind, bodies: Record<string, object> = {}): LineState[] {
  return Object.entries(bodies).map(([number, body]) => line(kind, number, body));
}

function termsSketch(reserveHundredths: number) {
  return {
    referenceOperatingPoint: "OP-1",
    reserves: [{ operatingPoint: "OP-1", hundredths: reserveHundredths }],
    growthTable: {
      estimated: 0.2,
      layout: 0.15,
      preliminary: 0.1,
      released: 0.05,
      measured_like_part: 0.03,
      measured_actual: 0,
    },
    countSize: 0.001,
  };
}

import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import type { Holder, LineEdit, TransferEdit } from "@/lib/evaluation/budget/edits";
import type { AllocationRow } from "@/lib/evaluation/lines/allocations-body";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { budgetState } from "@/tests/support/budget-state";

const AIR = {
  name: "Cruise",
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};

export function item(group: string | null, newtons = 4) {
  return {
    name: "item",
    ownerId: 1,
    group,
    order: 10,
    grade: "estimated",
    saving: newtons < 0,
    methodVersion: 1,
    method: "fixed",
    force: { value: newtons },
    source: "judgement",
  };
}

/** G10 holds 010 and G20, which holds 020 and 030; 040 and the saving 050 stand alone. */
export function stateWith(
  allocations: AllocationRow[],
  unallocatedHundredths: number,
  limitHundredths = 10000,
): BudgetState {
  return budgetState({
    code: "T-1",
    name: "Test",
    kind: "vehicle_fairing",
    point: AIR,
    otherPoints: { "OP-2": { ...AIR, limitHundredths: 8000 } },
    limitHundredths,
    reserveHundredths: 500,
    terms: {
      reserves: [
        { operatingPoint: "OP-1", hundredths: 500 },
        { operatingPoint: "OP-2", hundredths: 100 },
      ],
    },
    groups: { G10: { name: "Cab", order: 10 }, G20: { name: "Roof", parent: "G10", order: 20 } },
    items: { "010": item("G10"), "020": item("G20"), "030": item("G20"), "040": item(null), "050": item(null, -2) },
    allocations,
    unallocatedHundredths,
  });
}

export function row(kind: "item" | "group", number: string, hundredths: number): AllocationRow {
  return { kind, number, hundredths };
}

// 95.00 N can be allocated: 60.00 to the group, 10.00 to 040, −2.00 promised by 050, 27.00 unallocated.
export const ALLOCATED = stateWith(
  [
    row("group", "G10", 6000),
    row("item", "010", 2000),
    row("item", "020", 1500),
    row("item", "040", 1000),
    row("item", "050", -200),
  ],
  2700,
);

export const UNALLOCATED: Holder = { kind: "unallocated", number: null };
export const of = (number: string): Holder => ({ kind: number.startsWith("G") ? "group" : "item", number });
export const transfer = (giver: Holder, receiver: Holder, hundredths: number): TransferEdit => ({
  giver,
  receiver,
  hundredths,
});

export function sheetOf(state: BudgetState) {
  for (const line of state.lines) if (line.kind === "allocations") return line;
  throw new Error("no sheet");
}

export function heldAfter(transfers: TransferEdit[], edits: LineEdit[] = [], start = ALLOCATED) {
  const { state, faults, shortfall } = applyEdits(start, edits, transfers);
  const { rows, unallocatedHundredths } = sheetOf(state).body;
  const held = Object.fromEntries(rows.map(({ number, hundredths }) => [number, hundredths]));
  return { held, unallocated: unallocatedHundredths, faults, shortfall, letter: sheetOf(state).letter };
}

export function revise(kind: LineEdit["kind"], number: string, change: object): LineEdit {
  const line = ALLOCATED.lines.find((each) => each.kind === kind && each.number === number);
  return { operation: "revise", kind, number, baseLetter: "–", body: { ...line?.body, ...change } };
}

export function retire(kind: LineEdit["kind"], number: string): LineEdit {
  return { operation: "retire", kind, number, baseLetter: "–", body: null };
}

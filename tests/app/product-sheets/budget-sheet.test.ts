import { describe, expect, it } from "vitest";
import {
  type BudgetSheet,
  type ItemRow,
  budgetSheet,
  pointOf,
} from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { chosenRows, isOver, shownRows } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";
import { sheetAddress } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-address";
import { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";
import { sheetsOf } from "@/lib/budget/sheet-data";
import { budgetState, line } from "@/tests/support/budget-state";
import { SIGN_PANEL, sideFairing, signPanel } from "@/tests/support/demo-budgets";
import { frozenBudget } from "./frozen-budget";

function sheetOf(state: ReturnType<typeof signPanel>): BudgetSheet {
  const budget = frozenBudget(state);
  const point = pointOf(budget, undefined);
  if (!point) throw new Error("a budget has an operating point");
  return budgetSheet(budget, point);
}

/** Item 010 in a group, 020 in a subgroup of it, the others in none. */
function groupedFairing() {
  const state = sideFairing();
  return {
    ...state,
    lines: [
      line("group", "G10", { name: "Panels", order: 0 }),
      line("group", "G11", { name: "Outer", order: 0, parent: "G10" }),
      ...state.lines.map((each) =>
        each.kind === "item" && Number(each.number) <= 20
          ? { ...each, body: { ...each.body, group: each.number === "010" ? "G10" : "G11" } }
          : each,
      ),
    ],
  };
}

/** Numbers of the rows that a sheet shows to a person who asks this of it. */
function asked(state: ReturnType<typeof signPanel>, query: object, userId = 1): string[] {
  const { people, ...budget } = frozenBudget(state);
  const [sheet] = sheetsOf({ ...budget, issue: budget.issue.number });
  const rows = shownRows(sheet?.rows ?? [], people);
  return numbersOf(chosenRows(rows, SheetQuery.parse(query), { userId, isReference: true }));
}

function staveOf(state: ReturnType<typeof signPanel>) {
  const { rows, point } = sheetOf(state);
  return staveInput(rows, point);
}

const numbersOf = (rows: readonly { number: string }[]) => rows.map(({ number }) => number);

describe("the rows of the budget sheet", () => {
  it("print what the demo's table prints for basic, predicted and allocation", () => {
    const rows = sheetOf(signPanel()).rows.filter((row): row is ItemRow => row.kind === "item");

    expect(rows.map(({ number, allocationHundredths }) => [number, allocationHundredths])).toEqual(
      SIGN_PANEL.map(({ number, allocation }) => [number, Math.round(allocation * 100)]),
    );
    for (const { number, predicted } of SIGN_PANEL) {
      expect(rows.find((row) => row.number === number)?.predicted).toBeCloseTo(predicted, 1);
    }
  });

  it("call over exactly what the demo's table calls over", () => {
    const over = sheetOf(signPanel()).rows.filter(isOver);

    expect(numbersOf(over)).toEqual(["020", "060", "090", "100", "110"]);
  });

  it("sum a group over its subgroups and leave it without a margin where it has no allocation", () => {
    const grouped = groupedFairing();
    const rows = sheetOf(grouped).rows;
    const [outer, whole] = [rows.find(({ number }) => number === "G11"), rows.find(({ number }) => number === "G10")];
    const item = (number: string) => rows.find((row) => row.kind === "item" && row.number === number)?.predicted ?? NaN;

    expect(whole).toMatchObject({ kind: "group", members: ["010", "020"], marginHundredths: null, depth: 0 });
    expect(whole?.predicted).toBeCloseTo(item("010") + item("020"), 9);
    expect(outer?.predicted).toBeCloseTo(item("020"), 9);
  });

  it("show no margin for an item that is refused", () => {
    const state = budgetState({
      code: "T",
      name: "T",
      kind: "other_body",
      point: { fluid: "custom", density: { value: 1 }, dynamicViscosity: { value: 1 }, speed: { value: 1 } },
      limitHundredths: 1000,
      reserveHundredths: 0,
      items: {
        "010": {
          ...{ name: "Plate", ownerId: 1, order: 10, grade: "estimated", method: "flat-plate-friction" },
          ...{ methodVersion: 1, length: { value: 1 }, breadth: { value: 1 }, faces: 1, roughness: { value: 0 } },
        },
      },
      allocations: [{ kind: "item", number: "010", hundredths: 100 }],
    });
    const [row] = sheetOf(state).rows;

    expect(row).toMatchObject({ kind: "item", allocationHundredths: 100, marginHundredths: null });
    expect(staveOf(state).items).toEqual([]);
  });
});

describe("the stave of a sheet", () => {
  it("ends its solid part at the sum that is frozen", () => {
    const { items, basic } = staveOf(signPanel());

    expect(items.reduce((sum, item) => sum + item.basic, 0)).toBeCloseTo(basic, 9);
  });
});

describe("what the address asks of the sheet", () => {
  const ask = (query: object, userId = 1) => asked(signPanel(), query, userId);

  it("finds by words in number, name or owner, whatever their case", () => {
    expect(ask({ find: "FACE" })).toEqual(["010", "020"]);
    expect(ask({ find: "rear face" })).toEqual(["020"]);
    expect(ask({ find: "brackenholt" })).toHaveLength(SIGN_PANEL.length);
    expect(ask({ find: "nothing like it" })).toEqual([]);
  });

  it("shows only what is over, or only what the reader owns", () => {
    expect(ask({ only: "over" })).toEqual(["020", "060", "090", "100", "110"]);
    expect(ask({ only: "mine" }, 2)).toEqual([]);
  });

  it("sorts by a column, up and down", () => {
    expect(ask({ sort: "predicted", down: "1" }).slice(0, 2)).toEqual(["060", "040"]);
    expect(ask({ sort: "margin" })[0]).toBe("060");
  });

  it("keeps the groups of what is found, and folds a closed group with all below it", () => {
    const grouped = groupedFairing();

    expect(asked(grouped, { find: "020" })).toEqual(["G10", "G11", "020"]);
    expect(asked(grouped, { find: "010" })).toEqual(["G10", "010"]);
    expect(asked(grouped, { closed: "G10" }).slice(0, 2)).toEqual(["G10", "030"]);
    expect(asked(grouped, { closed: "G11" }).slice(0, 4)).toEqual(["G10", "G11", "010", "030"]);
    expect(asked(grouped, { sort: "number", closed: "G10" })).toContain("020");
  });

  it("reads what it does not know as if it were not there, and writes only what matters", () => {
    const query = SheetQuery.parse({ issue: "x", point: "<script>", sort: "sideways", only: "all", on: "yesterday" });

    expect(query).toEqual({ find: "", only: "all", sort: "sheet", closed: [] });
    expect(sheetAddress("/b", query, { point: "OP-2", find: "a b" })).toBe("/b?point=OP-2&find=a+b");
    expect(sheetAddress("/b", query, {})).toBe("/b");
  });
});

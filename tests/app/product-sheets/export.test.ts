import { read, utils, type WorkSheet } from "xlsx";
import { describe, expect, it } from "vitest";
import { csvText } from "@/app/(workspace)/products/[productCode]/_export/csv-text";
import { type ExportTable, sheetTable } from "@/app/(workspace)/products/[productCode]/_export/sheet-table";
import { xlsxFile } from "@/app/(workspace)/products/[productCode]/_export/xlsx-file";
import { budgetSheet, pointOf, sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { readingOf } from "@/lib/evaluation/measures/reading";
import type { Measure } from "@/lib/vocabulary/measures";
import { sideFairing, signPanel } from "@/tests/support/demo-budgets";
import { frozenBudget } from "./frozen-budget";

/** What is written here is read back by SheetJS (npm: xlsx), which shares no code with what writes it. */
const sheetOf = (text: string): WorkSheet => {
  const workbook = read(text, { type: "string", raw: true, FS: "," });
  return workbook.Sheets[workbook.SheetNames[0] ?? ""] ?? {};
};
const recordsOf = (sheet: WorkSheet) => utils.sheet_to_json<Record<string, unknown>>(sheet, { defval: null });

function tableOf(state: ReturnType<typeof signPanel>, measure: Measure = "newtons"): ExportTable {
  const budget = frozenBudget(state);
  const point = pointOf(budget, "OP-1");
  if (!point) throw new Error("a budget has an operating point");
  const sheet = budgetSheet(budget, point);
  const reading = readingOf(measure, sheetBasis(sheet), "si");
  if (!reading) throw new Error(`this product has no ${measure}`);
  return sheetTable(sheet, reading);
}

const NASTY = ["=2+5", "+1", "-1 °C", "@SUM(A1)", '=HYPERLINK("x")', "\tx", 'a "quoted", text', "two\r\nlines"];
const nasty: ExportTable = { headers: ["Text"], rows: NASTY.map((text) => [text]), about: [["Note", "=1"]] };

describe("the sheet as CSV", () => {
  it("reads back with one row per item and numbers as printed", () => {
    const records = recordsOf(sheetOf(csvText(tableOf(sideFairing()))));
    // The demo's own table D1: front panels 6.14 N basic, 6.76 N predicted, 7.0 N allocated; total 54.96 and 61.59 N.
    const first = records.find((record) => record.Item === "010");
    expect(Number(first?.["Basic [N]"])).toBe(6.14);
    expect(Number(first?.["Predicted [N]"])).toBe(6.76);
    expect(Number(first?.["Allocation at the reference point [N]"])).toBe(7);
    const total = records.at(-1);
    expect(total).toMatchObject({ Item: "total", "Operating point": "OP-1" });
    expect([Number(total?.["Basic [N]"]), Number(total?.["Predicted [N]"])]).toEqual([54.96, 61.59]);
  });

  it("has the chosen measure beside the newtons, its unit in each header and what it is referred to", async () => {
    const table = tableOf(sideFairing(), "counts");
    const records = recordsOf(sheetOf(csvText(table)));
    // The demo's own table D1: P = 61.59 N at q 382.8 Pa on 10.0 m² is 16.1 road counts; 010 has 6.76 N.
    expect(Number(records.at(-1)?.["Predicted, counts [counts]"])).toBeCloseTo(16.1, 1);
    const first = records.find((record) => record.Item === "010");
    expect(Number(first?.["Predicted [N]"])).toBe(6.76);
    expect(Number(first?.["Predicted, counts [counts]"])).toBeCloseTo(6.76 / (382.8 * 10 * 0.001), 2);
    expect(Number(first?.["Margin, counts [counts]"])).toBeCloseTo((7 - 6.76) / (382.8 * 10 * 0.001), 2);
    expect(Object.fromEntries(table.about)["Read in"]).toBe(
      "Counts, 1 count = 0.001 on 10.00\u2009m²; newtons are kept, and decide",
    );
    const workbook = read(await xlsxFile(table));
    expect(recordsOf(workbook.Sheets.Budget ?? {}).at(-1)?.["Predicted, counts [counts]"]).toBeCloseTo(16.1, 1);
  });

  it("lets no text become a formula, and loses no character", () => {
    const [, ...rows] = utils.sheet_to_json<string[]>(sheetOf(csvText(nasty)), { header: 1 });
    const texts = rows.map(([text]) => text ?? "");
    expect(texts.map((text) => text.replace(/^'/, "").replaceAll("\r\n", "\n"))).toEqual(
      NASTY.map((text) => text.replaceAll("\r\n", "\n")),
    );
    for (const text of texts) expect(text).not.toMatch(/^[=+\-@\t]/);
  });

  it("carries the caution of a sign panel in every row", () => {
    for (const record of recordsOf(sheetOf(csvText(tableOf(signPanel()))))) {
      expect(record.Caution).toMatch(/not a structural wind load: the local wind-load code and a licensed engineer/);
    }
  });
});

describe("the sheet as XLSX", () => {
  it("reads back with numbers as numbers, and the title block on a sheet of its own", async () => {
    const workbook = read(await xlsxFile(tableOf(sideFairing())));
    expect(workbook.SheetNames).toEqual(["Budget", "About"]);
    const records = recordsOf(workbook.Sheets.Budget ?? {});
    expect(records.find((record) => record.Item === "010")).toMatchObject({ "Basic [N]": 6.14, "Predicted [N]": 6.76 });
    expect(records.at(-1)).toMatchObject({ Item: "total", "Predicted [N]": 61.59 });
    for (const [header, value] of Object.entries(records[0] ?? {})) {
      const needsUnit = typeof value === "number" && !["Issue", "Method version"].includes(header);
      if (needsUnit) expect(header).toMatch(/ \[\S.*\]$/);
    }
    const about = Object.fromEntries(utils.sheet_to_json<string[]>(workbook.Sheets.About ?? {}, { header: 1 }));
    expect(about).toMatchObject({ Issue: "1", Proposed: "established" });
  });

  it("stores texts as texts: no cell is a formula", async () => {
    const workbook = read(await xlsxFile(nasty), { cellFormula: true });
    const cells = Object.entries(workbook.Sheets.Budget ?? {}).filter(([name]) => !name.startsWith("!"));
    expect(cells).toHaveLength(1 + NASTY.length);
    for (const [name, cell] of cells) expect([name, cell.t, cell.f]).toEqual([name, "s", undefined]);
  });
});

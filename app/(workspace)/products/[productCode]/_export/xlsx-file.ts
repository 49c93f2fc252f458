import writeExcelFile from "write-excel-file/node";

import { neutralised } from "./csv-text";
import type { ExportCell, ExportTable } from "./sheet-table";

const WIDTHS: Record<string, number> = { Name: 34, Group: 24, Owner: 20, Method: 20, Notes: 60, Caution: 60 };

/** Two sheets: the budget as a table, and the title block. Texts are stored as texts, never as formulas. */
export function xlsxFile({ headers, rows, about }: ExportTable): Promise<Buffer> {
  const head = headers.map((value) => ({ value, type: String, fontWeight: "bold" as const }));
  return writeExcelFile([
    {
      sheet: "Budget",
      data: [head, ...rows.map((row) => row.map(cellOf))],
      columns: headers.map((header) => ({ width: WIDTHS[header] ?? 14 })),
      stickyRowsCount: 1,
    },
    {
      sheet: "About",
      data: about.map((row) => row.map(cellOf)),
      columns: [{ width: 18 }, { width: 80 }],
    },
  ]).toBuffer();
}

function cellOf(cell: ExportCell) {
  if (cell === null) return null;
  return typeof cell === "number" ? { value: cell, type: Number } : { value: neutralised(cell), type: String };
}

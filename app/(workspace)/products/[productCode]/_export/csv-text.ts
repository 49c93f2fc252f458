import type { ExportCell, ExportTable } from "./sheet-table";

/** What a spreadsheet would take for the start of a formula. */
const FORMULA_START = /^[=+\-@\t\r]/;

/** RFC 4180: commas, quotes doubled inside quotes, lines that end in CRLF. No text can become a formula. */
export function csvText({ headers, rows }: ExportTable): string {
  return [headers, ...rows].map((row) => `${row.map(cellText).join(",")}\r\n`).join("");
}

function cellText(cell: ExportCell): string {
  if (cell === null) return "";
  if (typeof cell === "number") return String(cell);
  const text = neutralised(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** An apostrophe ahead keeps it text. */
export function neutralised(text: string): string {
  return FORMULA_START.test(text) ? `'${text}` : text;
}

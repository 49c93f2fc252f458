import type { SheetQuery } from "./sheet-filter";

/** The same address with some of it changed; what is as it would be anyway is left out. */
export function sheetAddress(path: string, query: SheetQuery, change: Partial<SheetQuery>): string {
  const next = { ...query, ...change };
  const parts = new URLSearchParams();
  if (next.issue !== undefined) parts.set("issue", String(next.issue));
  if (next.on !== undefined) parts.set("on", next.on);
  if (next.point !== undefined) parts.set("point", next.point);
  if (next.measure !== undefined) parts.set("measure", next.measure);
  if (next.find !== "") parts.set("find", next.find);
  if (next.only !== "all") parts.set("only", next.only);
  if (next.sort !== "sheet") parts.set("sort", next.sort);
  if (next.down !== undefined) parts.set("down", next.down);
  if (next.closed.length > 0) parts.set("closed", next.closed.join(","));
  const text = parts.toString();
  return text === "" ? path : `${path}?${text}`;
}

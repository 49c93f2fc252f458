import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { dataFolder } from "@/models/database";
import { rows } from "./rows";

/** 10: every row of a file has its file with that very content, and no file stands there without a row. */
export async function fileContentFaults(): Promise<string[]> {
  const held = await rows<{ id: number; sha256: string; size: number }>("SELECT id, sha256, size FROM attachments");
  const folder = path.join(dataFolder(), "files");
  const faults = held.flatMap(({ id, sha256, size }) => {
    const file = path.join(folder, sha256.slice(0, 2), sha256);
    if (!existsSync(file)) return [`10: file ${id} is not on the disk.`];
    const content = readFileSync(file);
    const hash = createHash("sha256").update(content).digest("hex");
    return hash === sha256 && content.length === size ? [] : [`10: file ${id} holds something else on the disk.`];
  });
  const known = new Set(held.map(({ sha256 }) => sha256));
  const standing = existsSync(folder) ? readdirSync(folder, { recursive: true, withFileTypes: true }) : [];
  const lost = standing.filter((entry) => entry.isFile() && !known.has(entry.name));
  return [...faults, ...lost.map(({ name }) => `10: the file ${name} has no row.`)];
}

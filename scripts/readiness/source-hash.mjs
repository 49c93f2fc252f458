// @ts-check
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, statSync } from "node:fs";
import path from "node:path";
import { repositoryRoot } from "./repository-root.mjs";

/** Folders that the build reads. Tests and scripts are not in it: they do not change the application. */
const FOLDERS = ["app", "lib", "models", "policies", "public", "templates"];

const GENERATED = ["next-env.d.ts"];

/** One hash over the path and content of every source file of the application. */
export function sourceHash() {
  const hash = createHash("sha256").update(process.version);
  for (const file of [...rootFiles(), ...FOLDERS.flatMap(filesBelow)]) {
    hash.update(`\n${file}\n`).update(readFileSync(path.join(repositoryRoot, file)));
  }
  return hash.digest("hex");
}

/** Configuration, proxy and instrumentation. */
function rootFiles() {
  const written = (/** @type {string} */ name) => /^[^.].*\.(ts|mjs|json)$/.test(name) && !GENERATED.includes(name);
  return readdirSync(repositoryRoot).filter(written).sort();
}

/**
 * @param {string} relative
 * @returns {string[]}
 */
function filesBelow(relative) {
  const absolute = path.join(repositoryRoot, relative);
  if (!existsSync(absolute)) return [];
  if (statSync(absolute).isFile()) return [relative];
  return readdirSync(absolute)
    .sort()
    .flatMap((name) => filesBelow(`${relative}/${name}`));
}

// @ts-check
import { createHash } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { repositoryRoot } from "./repository-root.mjs";
import { runProgram } from "./run-program.mjs";

const LOCK = path.join(repositoryRoot, "package-lock.json");
const INSTALLED = path.join(repositoryRoot, "node_modules/.package-lock.json");
const STAMP = path.join(repositoryRoot, "node_modules/.leeboard-packages");

/** Installs what package-lock.json names, unless exactly that is installed already. */
export async function ensurePackages() {
  const wanted = packagesStamp();
  if (existsSync(STAMP) && readFileSync(STAMP, "utf8") === wanted) return;
  if (!installedAsLocked()) {
    console.log("Installing packages. This takes a minute or two, and only happens when they change.");
    // Development packages are part of it: the build needs them, whatever NODE_ENV says.
    const code = await runProgram("npm", ["ci", "--include=dev", "--no-audit", "--no-fund"], { NODE_ENV: "" });
    if (code !== 0) throw new Error("The packages could not be installed; npm says above why.");
  }
  writeFileSync(STAMP, wanted);
}

/** The lock file and the Node version together decide what node_modules must hold. */
function packagesStamp() {
  return createHash("sha256").update(readFileSync(LOCK)).update(process.version).digest("hex");
}

/** True when npm's own record of node_modules agrees with the lock, as after an `npm install` by hand. */
function installedAsLocked() {
  if (!existsSync(INSTALLED)) return false;
  const locked = packagesOf(LOCK);
  const installed = packagesOf(INSTALLED);
  const missing = Object.entries(locked).filter(
    ([where, entry]) => where !== "" && !entry.optional && !entry.peer && installed[where]?.version !== entry.version,
  );
  return missing.length === 0;
}

/**
 * @param {string} file
 * @returns {Record<string, { version?: string, optional?: boolean, peer?: boolean }>}
 */
function packagesOf(file) {
  return JSON.parse(readFileSync(file, "utf8")).packages ?? {};
}

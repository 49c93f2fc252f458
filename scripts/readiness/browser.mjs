// @ts-check
import { existsSync } from "node:fs";
import { runProgram } from "./run-program.mjs";

const CHROMIUM = "/usr/bin/chromium";

/**
 * Installs Debian's Chromium for the browser tests when it is missing.
 * @returns {Promise<string | null>} a sentence when there is none and it cannot be installed
 */
export async function browserFault() {
  if (existsSync(CHROMIUM)) return null;
  if (process.getuid?.() !== 0) {
    return "The browser tests need Chromium at /usr/bin/chromium: install it with “sudo apt-get install chromium” and run npm test again.";
  }
  console.log("Installing Chromium for the browser tests.");
  const quiet = { DEBIAN_FRONTEND: "noninteractive" };
  const updated = await runProgram("apt-get", ["update", "-q"], quiet).catch(() => 1);
  const installed =
    updated === 0 &&
    (await runProgram("apt-get", ["install", "-q", "-y", "--no-install-recommends", "chromium"], quiet)) === 0;
  return installed && existsSync(CHROMIUM)
    ? null
    : "The browser tests need Chromium at /usr/bin/chromium, and it could not be installed from Debian; apt-get says above why.";
}

// @ts-check
import { accessSync, constants, mkdirSync } from "node:fs";
import { createServer } from "node:net";
import { portsOf } from "./settings.mjs";

/**
 * What would keep Leeboard from starting, in sentences: told before minutes go into installing and building.
 * @param {import("./settings.mjs").Settings} settings
 */
export async function preconditionFaults(settings) {
  const portFaults = await Promise.all(portsOf(settings).map(portFault));
  return [dataFolderFault(settings.dataFolder), ...portFaults].filter((fault) => fault !== null);
}

/** @param {string} folder */
function dataFolderFault(folder) {
  try {
    mkdirSync(folder, { recursive: true });
    accessSync(folder, constants.R_OK | constants.W_OK | constants.X_OK);
    return null;
  } catch (error) {
    return `The data folder ${folder} cannot be written (${codeOf(error)}). Give this account the right to, or set LEEBOARD_DATA to another folder.`;
  }
}

/**
 * @param {{ port: number, variable: string, purpose: string }} wanted
 * @returns {Promise<string | null>}
 */
function portFault({ port, variable, purpose }) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", (error) => {
      const code = codeOf(error);
      const why =
        code === "EADDRINUSE"
          ? "is in use by another program"
          : code === "EACCES"
            ? "may not be opened by this account"
            : `cannot be opened (${code})`;
      resolve(`Port ${port} for ${purpose} ${why}. Stop what uses it, or set ${variable} to another port.`);
    });
    probe.listen(port, "127.0.0.1", () => probe.close(() => resolve(null)));
  });
}

/** @param {unknown} error */
function codeOf(error) {
  return error instanceof Error && "code" in error ? String(error.code) : String(error);
}

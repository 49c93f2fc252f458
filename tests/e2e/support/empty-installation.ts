import { spawn, type ChildProcess } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { freePort } from "./running-application";

export interface EmptyInstallation {
  address: string;
  /** Printed once by the first start. */
  administrator: { email: string; password: string };
  stop: () => Promise<void>;
}

const ADMINISTRATOR = "ada@example.org";

/** What somebody has who starts Leeboard without the demo: one account, and its password on the terminal. */
export async function emptyInstallation(): Promise<EmptyInstallation> {
  const { repositoryRoot } = await import("@/scripts/readiness/repository-root.mjs");
  const dataFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-empty-"));
  const [port, smtpPort, webPort] = [await freePort(), await freePort(), await freePort()];
  const child = spawn(process.execPath, ["scripts/start.mjs"], {
    cwd: repositoryRoot,
    stdio: ["ignore", "pipe", "pipe"],
    env: {
      ...process.env,
      PORT: String(port),
      LEEBOARD_MAIL_PORT: String(smtpPort),
      LEEBOARD_MAIL_WEB_PORT: String(webPort),
      LEEBOARD_DATA: dataFolder,
      LEEBOARD_DEMO: "off",
      LEEBOARD_ADMIN_EMAIL: ADMINISTRATOR,
    },
  });
  const ended = new Promise<void>((resolve) => child.once("exit", () => resolve()));
  const stop = async () => {
    child.kill("SIGTERM");
    await ended;
    rmSync(dataFolder, { recursive: true, force: true });
  };
  try {
    const printed = await printedUntil(child, /Leeboard runs at (\S+)/);
    const address = /Leeboard runs at (\S+)/.exec(printed)?.[1];
    const password = /The first account: \S+, password (\S+)/.exec(printed)?.[1];
    if (!address || !password) throw new Error(`The start names no address or no first account:\n${printed}`);
    return { address, administrator: { email: ADMINISTRATOR, password }, stop };
  } catch (error) {
    await stop();
    throw error;
  }
}

/** Everything that a program prints until a text comes; fails when it ends before. */
function printedUntil(child: ChildProcess, wanted: RegExp): Promise<string> {
  return new Promise((resolve, reject) => {
    let printed = "";
    const read = (chunk: Buffer) => {
      printed += chunk.toString();
      if (wanted.test(printed)) resolve(printed);
    };
    child.stdout?.on("data", read);
    child.stderr?.on("data", read);
    child.once("exit", () => reject(new Error(`The start ended by itself:\n${printed}`)));
  });
}

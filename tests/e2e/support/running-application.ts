import { cpSync, mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import os from "node:os";
import path from "node:path";

export interface RunningApplication {
  address: string;
  /** Where the mail catcher answers. */
  mailAddress: string;
  dataFolder: string;
  stop: () => Promise<void>;
}

/** The built application on a free port, with a data folder and a mail catcher of its own. */
export async function runningApplication(template: string): Promise<RunningApplication> {
  const { startMailCatcher } = await import("@/scripts/start/mail-catcher.mjs");
  const { applicationEnvironment, startApplication } = await import("@/scripts/start/application.mjs");

  const dataFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-browser-"));
  cpSync(template, dataFolder, { recursive: true });
  const mail = await startMailCatcher({ smtpPort: 0, webPort: 0 });
  const stopMail = async () => {
    await mail.stop();
    rmSync(dataFolder, { recursive: true, force: true });
  };
  try {
    const port = await freePort();
    const facts = { port, dataFolder, secret: "for the browser tests only, never for a real installation" };
    const environment = applicationEnvironment({ ...facts, smtpUrl: null, mailPort: mail.smtpPort });
    const application = await startApplication({ port, environment });
    return {
      address: application.address,
      mailAddress: `http://127.0.0.1:${mail.webPort}`,
      dataFolder,
      stop: () => application.stop().finally(stopMail),
    };
  } catch (error) {
    await stopMail();
    throw error;
  }
}

export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() =>
        typeof address === "object" && address ? resolve(address.port) : reject(new Error("no port")),
      );
    });
  });
}

// @ts-check
import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";

/**
 * Catches every mail and shows it on a page of its own; nothing leaves this machine. Port 0 takes a free one.
 * @param {{ smtpPort: number, webPort: number }} ports
 * @returns {Promise<{ smtpPort: number, webPort: number, stop: () => Promise<void> }>}
 */
export async function startMailCatcher({ smtpPort, webPort }) {
  // Loaded late: the packages may just have been installed.
  const { MailDev } = await import("maildev");
  const mailFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-mail-"));
  const catcher = new MailDev({
    smtp: smtpPort,
    web: webPort,
    ip: "127.0.0.1",
    webIp: "127.0.0.1",
    mailDirectory: mailFolder,
    silent: true,
  });
  const { smtp, api } = await quietly(() => catcher.start());
  return {
    smtpPort: portOf(smtp.getAddress()),
    webPort: portOf(api?.getAddress()),
    stop: async () => {
      await catcher.stop();
      rmSync(mailFolder, { recursive: true, force: true });
    },
  };
}

/**
 * The catcher announces its address even when told to be silent; the caller prints it once, with the others.
 * @template Result
 * @param {() => Promise<Result>} work
 */
async function quietly(work) {
  const { info } = console;
  console.info = () => {};
  try {
    return await work();
  } finally {
    console.info = info;
  }
}

/** @param {{ port: number } | null | undefined} address */
function portOf(address) {
  if (!address) throw new Error("The mail catcher did not open its port.");
  return address.port;
}

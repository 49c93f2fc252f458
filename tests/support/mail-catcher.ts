import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import MailDev from "maildev";
import { z } from "zod";

const Caught = z.array(
  z.object({
    subject: z.string(),
    text: z.string(),
    headers: z.record(z.string(), z.unknown()),
    to: z.array(z.object({ address: z.string() })),
  }),
);
export type CaughtMail = z.infer<typeof Caught>[number];

export interface MailCatcher {
  smtpPort: number;
  mails(): Promise<CaughtMail[]>;
  stop(): Promise<void>;
}

/** A mail server of its own for one test, on free ports unless one is given. */
export async function startMailCatcher(smtpPort = 0): Promise<MailCatcher> {
  const mailDirectory = mkdtempSync(path.join(tmpdir(), "leeboard-mail-"));
  const options = { smtp: smtpPort, web: 0, ip: "127.0.0.1", webIp: "127.0.0.1", silent: true, mailDirectory };
  const catcher = new MailDev(options);
  const { smtp, api } = await catcher.start();
  const webPort = api?.getAddress()?.port;
  if (webPort === undefined) throw new Error("The mail catcher has no page to ask.");
  return {
    smtpPort: smtp.getAddress().port,
    mails: async () => Caught.parse(await (await fetch(`http://127.0.0.1:${webPort}/api/email`)).json()),
    stop: async () => {
      await catcher.stop();
      rmSync(mailDirectory, { recursive: true, force: true });
    },
  };
}

/** A port that nobody listens on at this moment. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", reject);
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      server.close(() =>
        address && typeof address === "object" ? resolve(address.port) : reject(new Error("no port")),
      );
    });
  });
}

import { spawn, type ChildProcess } from "node:child_process";
import { cpSync, mkdtempSync, rmSync, statSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { expect, test } from "@playwright/test";
import { DEMO_PASSWORD, DEMO_PEOPLE } from "@/scripts/demo/people";
import { freePort } from "./support/running-application";

interface Started {
  child: ChildProcess;
  printed: () => string;
  ended: Promise<number | null>;
}

/** The start command as a person gives it, with everything where the test wants it. */
function start(dataFolder: string, [port, mailPort, mailWebPort]: readonly number[]): Started {
  const child = spawn(process.execPath, ["scripts/start.mjs"], {
    env: {
      ...process.env,
      ...{ LEEBOARD_DATA: dataFolder, PORT: String(port), SMTP_URL: "", NEXTAUTH_SECRET: "" },
      ...{ LEEBOARD_MAIL_PORT: String(mailPort), LEEBOARD_MAIL_WEB_PORT: String(mailWebPort) },
    },
  });
  let output = "";
  for (const stream of [child.stdout, child.stderr]) stream.on("data", (chunk) => (output += String(chunk)));
  const ended = new Promise<number | null>((resolve) => child.on("exit", resolve));
  return { child, printed: () => output, ended };
}

const answers = (port: number) =>
  fetch(`http://127.0.0.1:${port}/`).then(
    () => true,
    () => false,
  );

test("the start prints one address that works, Ctrl-C stops all of it, and a second start keeps the data", async () => {
  test.setTimeout(240_000);
  const template = process.env.LEEBOARD_DEMO_TEMPLATE ?? "";
  const dataFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-start-"));
  cpSync(template, dataFolder, { recursive: true });
  const [port = 0, mailPort = 0, mailWebPort = 0] = [await freePort(), await freePort(), await freePort()];
  const running: ChildProcess[] = [];
  try {
    const keys: string[] = [];
    for (const time of ["first", "second"]) {
      const { child, printed, ended } = start(dataFolder, [port, mailPort, mailWebPort]);
      running.push(child);
      await expect.poll(printed, { message: `${time} start`, timeout: 90_000 }).toContain("Ctrl-C stops everything.");

      expect(printed().match(/http:\/\/[\w.:]+/g)).toEqual([
        `http://127.0.0.1:${port}`,
        `http://127.0.0.1:${mailWebPort}`,
      ]);
      expect(printed()).toContain(DEMO_PEOPLE.lusia.email);
      expect(printed()).toContain(DEMO_PASSWORD);
      expect(printed()).not.toContain("Filling the empty database");
      expect(await answers(port)).toBe(true);
      expect(await answers(mailWebPort)).toBe(true);
      const key = statSync(path.join(dataFolder, "NEXTAUTH_SECRET"));
      expect(key.mode & 0o777).toBe(0o600);
      keys.push(`${key.mtimeMs}`);

      child.kill("SIGINT");
      expect(await ended).toBe(0);
      expect(await answers(port)).toBe(false);
      expect(await answers(mailWebPort)).toBe(false);
    }
    expect(keys[1]).toBe(keys[0]);
  } finally {
    for (const child of running) child.kill("SIGKILL");
    rmSync(dataFolder, { recursive: true, force: true });
  }
});

// @ts-check
import { spawn } from "node:child_process";
import { repositoryRoot } from "../readiness/repository-root.mjs";

const ADDRESS = "127.0.0.1";

/**
 * What the application reads from its environment.
 * @param {{ port: number, dataFolder: string, secret: string, smtpUrl: string | null, mailPort: number | null }} facts
 * @returns {Record<string, string>}
 */
export function applicationEnvironment({ port, dataFolder, secret, smtpUrl, mailPort }) {
  return {
    NODE_ENV: "production",
    NEXT_TELEMETRY_DISABLED: "1",
    NEXTAUTH_SECRET: secret,
    // Also the base of the links in mails.
    NEXTAUTH_URL: `http://${ADDRESS}:${port}`,
    LEEBOARD_DATA: dataFolder,
    ...(smtpUrl ? { SMTP_URL: smtpUrl } : {}),
    ...(mailPort ? { LEEBOARD_MAIL_PORT: String(mailPort) } : {}),
  };
}

/**
 * Starts the built application as a direct child, so that a signal reaches it, and waits until it answers.
 * What it prints before is shown only if it fails: one address is printed, by the caller.
 * @param {{ port: number, environment: Record<string, string> }} options
 * @returns {Promise<{ address: string, ended: Promise<number>, stop: () => Promise<void> }>}
 */
export async function startApplication({ port, environment }) {
  const child = spawn(
    process.execPath,
    ["node_modules/next/dist/bin/next", "start", "-p", String(port), "-H", ADDRESS],
    { cwd: repositoryRoot, env: { ...process.env, ...environment }, stdio: ["ignore", "pipe", "pipe"] },
  );
  /** @type {Promise<number>} */
  const ended = new Promise((resolve) => child.on("exit", (code) => resolve(code ?? 1)));
  const address = `http://${ADDRESS}:${port}`;
  const output = holdOutput(child);
  const stop = () => stopChild(child, ended);
  try {
    await answers(`${address}/sign-in`, ended);
  } catch (error) {
    output.release();
    await stop();
    throw error;
  }
  output.passOn();
  return { address, ended, stop };
}

/** @param {import("node:child_process").ChildProcessByStdio<null, import("node:stream").Readable, import("node:stream").Readable>} child */
function holdOutput(child) {
  /** @type {Buffer[]} */
  const held = [];
  let holding = true;
  for (const stream of [child.stdout, child.stderr]) {
    stream.on("data", (chunk) => (holding ? held.push(chunk) : process.stderr.write(chunk)));
  }
  return {
    release: () => process.stderr.write(Buffer.concat(held)),
    passOn: () => void (holding = false),
  };
}

/**
 * Resolves at the first answer that is no server error.
 * @param {string} url
 * @param {Promise<number>} ended
 */
async function answers(url, ended) {
  let over = false;
  void ended.then(() => (over = true));
  const deadline = Date.now() + 60_000;
  let last = "it does not answer";
  while (!over && Date.now() < deadline) {
    const status = await fetch(url, { redirect: "manual" }).then(
      (response) => response.status,
      () => 0,
    );
    if (status > 0 && status < 500) return;
    if (status >= 500) last = `it answers with status ${status}`;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`The application did not start: ${over ? "it ended" : last}. What it printed stands above.`);
}

/**
 * @param {import("node:child_process").ChildProcess} child
 * @param {Promise<number>} ended
 */
async function stopChild(child, ended) {
  if (child.exitCode !== null || child.signalCode !== null) return;
  child.kill("SIGTERM");
  const insist = setTimeout(() => child.kill("SIGKILL"), 5_000);
  await ended;
  clearTimeout(insist);
}

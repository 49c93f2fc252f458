import { spawn } from "node:child_process";
import path from "node:path";
import { onTestFinished } from "vitest";

const root = path.resolve(__dirname, "../..");

export interface FinishedProgram {
  code: number | null;
  /** What it printed, both streams in the order they came. */
  output: string;
}

/** Runs a Node program to its end, in the repository unless told otherwise; it cannot outlive its test. */
export function finishedProgram(
  args: readonly string[],
  { environment = {}, folder = root }: { environment?: Record<string, string>; folder?: string } = {},
): Promise<FinishedProgram> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, { cwd: folder, env: { ...cleanEnvironment(), ...environment } });
    onTestFinished(() => void child.kill("SIGKILL"));
    let output = "";
    for (const stream of [child.stdout, child.stderr]) stream.on("data", (chunk) => (output += String(chunk)));
    child.on("error", reject);
    child.on("close", (code) => resolve({ code, output }));
  });
}

/** This process's environment without what vitest set for its workers: a program under test starts like by hand. */
function cleanEnvironment(): NodeJS.ProcessEnv {
  const own = Object.entries(process.env).filter(
    ([name]) => !/^(VITEST|NODE_ENV$|TEST$|PORT$|LEEBOARD_|SMTP_URL$)/.test(name),
  );
  return { ...Object.fromEntries(own), NODE_ENV: "development" };
}

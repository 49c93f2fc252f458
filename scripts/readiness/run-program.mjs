// @ts-check
import { spawn } from "node:child_process";
import { repositoryRoot } from "./repository-root.mjs";

/**
 * Runs a program to its end with its output on this screen. A signal to this process ends the program first and
 * then this process, so that nothing stays behind and no later step is taken.
 * @param {string} program
 * @param {readonly string[]} args
 * @param {Record<string, string>} [environment] added to this process's own
 * @returns {Promise<number>} its exit code; 1 when a signal ended it
 */
export function runProgram(program, args, environment = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      cwd: repositoryRoot,
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1", ...environment },
      stdio: "inherit",
    });
    let interrupted = false;
    const passOn = (/** @type {NodeJS.Signals} */ signal) => {
      interrupted = true;
      child.kill(signal);
    };
    const signals = /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"]);
    for (const signal of signals) process.on(signal, passOn);
    const ended = () => {
      for (const signal of signals) process.off(signal, passOn);
      if (interrupted) process.exit(130);
    };
    child.on("error", (error) => {
      ended();
      reject(error);
    });
    child.on("exit", (code) => {
      ended();
      resolve(code ?? 1);
    });
  });
}

/**
 * A JavaScript program of an installed package, run by this same Node.
 * @param {string} file path inside node_modules
 * @param {readonly string[]} args
 * @param {Record<string, string>} [environment]
 */
export function runInstalled(file, args, environment) {
  return runProgram(process.execPath, [`node_modules/${file}`, ...args], environment);
}

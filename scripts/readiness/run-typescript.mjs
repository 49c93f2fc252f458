// @ts-check
import { mkdirSync, rmSync } from "node:fs";
import path from "node:path";
import { repositoryRoot } from "./repository-root.mjs";
import { runProgram } from "./run-program.mjs";

/**
 * Runs a script that uses the domain. Bundled as an ES module first: some packages exist as such only, and a loader
 * that turns our files into CommonJS one by one cannot import them.
 * @param {string} file relative to the repository
 * @param {readonly string[]} args
 * @param {Record<string, string>} [environment]
 * @returns {Promise<number>} its exit code
 */
export async function runTypeScript(file, args, environment) {
  // Loaded late: the packages may just have been installed.
  const { build, stop } = await import("esbuild");
  // Inside node_modules, so that the packages are found from there.
  const folder = path.join(repositoryRoot, "node_modules/.cache/leeboard");
  mkdirSync(folder, { recursive: true });
  const bundle = path.join(folder, `${path.basename(file, ".ts")}-${process.pid}.mjs`);
  try {
    await build({
      absWorkingDir: repositoryRoot,
      entryPoints: [file],
      outfile: bundle,
      bundle: true,
      platform: "node",
      format: "esm",
      packages: "external",
      sourcemap: "inline",
      logLevel: "warning",
    });
    // Its helper process would otherwise live as long as this one.
    await stop();
    const conditions = ["--conditions=react-server", "--enable-source-maps"];
    return await runProgram(process.execPath, [...conditions, bundle, ...args], environment);
  } finally {
    rmSync(bundle, { force: true });
  }
}

// @ts-check
import path from "node:path";
import { fileURLToPath } from "node:url";

/** Scripts work from any current folder. */
export const repositoryRoot = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "../..");

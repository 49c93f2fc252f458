// @ts-check
import { randomBytes } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";

/**
 * The key that signs session cookies: NEXTAUTH_SECRET of the environment, or one made at the first start and kept
 * beside the database, readable by this account only. A new key would sign everybody out.
 * @param {string} dataFolder
 * @returns {string}
 */
export function sessionSecret(dataFolder) {
  if (process.env.NEXTAUTH_SECRET) return process.env.NEXTAUTH_SECRET;
  const file = path.join(dataFolder, "NEXTAUTH_SECRET");
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString("base64url"), { mode: 0o600, flag: "wx" });
  return readFileSync(file, "utf8").trim();
}

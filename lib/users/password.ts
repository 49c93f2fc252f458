import { randomBytes, scrypt, timingSafeEqual, type ScryptOptions } from "node:crypto";

export interface ScryptCost {
  /** log₂ of N. */
  logN: number;
  r: number;
  p: number;
}

/** N = 2¹⁵, r = 8, p = 3: one of the settings of the OWASP password storage cheat sheet; about a quarter of a second. */
export const SCRYPT_COST: ScryptCost = { logN: 15, r: 8, p: 3 };

const KEY_LENGTH = 32;
const SALT_LENGTH = 16;
const MAX_AT_ONCE = 2;

/** Hash with its own salt and cost in one text, so that the cost can be raised without losing old hashes. */
export async function hashPassword(password: string, cost: ScryptCost = SCRYPT_COST): Promise<string> {
  const salt = randomBytes(SALT_LENGTH);
  const key = await derive(password, salt, cost);
  return ["scrypt", cost.logN, cost.r, cost.p, salt.toString("base64url"), key.toString("base64url")].join("$");
}

export async function verifyPassword(password: string, stored: string): Promise<boolean> {
  const [name, logN, r, p, salt, key] = stored.split("$");
  if (name !== "scrypt" || salt === undefined || key === undefined) return false;
  const expected = Buffer.from(key, "base64url");
  const cost = { logN: Number(logN), r: Number(r), p: Number(p) };
  const derived = await derive(password, Buffer.from(salt, "base64url"), cost);
  return derived.length === expected.length && timingSafeEqual(derived, expected);
}

/** The work of a check without an account to check: an unknown address takes as long as a wrong password. */
export async function spendPasswordCheck(password: string): Promise<void> {
  await derive(password, Buffer.alloc(SALT_LENGTH), SCRYPT_COST);
}

let running = 0;
const waiting: (() => void)[] = [];

/** Two at once at most: hashing shares the thread pool's four threads with the database. */
async function derive(password: string, salt: Buffer, { logN, r, p }: ScryptCost): Promise<Buffer> {
  if (running >= MAX_AT_ONCE) await new Promise<void>((turn) => waiting.push(turn));
  else running += 1;
  try {
    const options: ScryptOptions = { N: 2 ** logN, r, p, maxmem: 256 * 1024 * 1024 };
    return await new Promise((resolve, reject) => {
      // NFKC, so that the same characters typed on another keyboard are the same password.
      scrypt(password.normalize("NFKC"), salt, KEY_LENGTH, options, (problem, key) =>
        problem ? reject(problem) : resolve(key),
      );
    });
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}

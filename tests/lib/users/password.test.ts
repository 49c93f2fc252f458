import { scryptSync } from "node:crypto";
import { expect, it } from "vitest";
import { hashPassword, SCRYPT_COST, verifyPassword } from "@/lib/users/password";

const CHEAP = { logN: 4, r: 8, p: 1 };

it("is scrypt with the cost and the salt that stand in the text", async () => {
  const [name, logN, r, p, salt = "", key = ""] = (await hashPassword("correct horse battery")).split("$");

  expect([name, logN, r, p]).toEqual(["scrypt", "15", "8", "3"]);
  expect(Buffer.from(salt, "base64url")).toHaveLength(16);
  const again = scryptSync("correct horse battery", Buffer.from(salt, "base64url"), 32, {
    ...{ N: 2 ** 15, r: 8, p: 3, maxmem: 256 * 1024 * 1024 },
  });
  expect(Buffer.from(key, "base64url").equals(again)).toBe(true);
});

it("costs no less than the weakest setting of the OWASP password storage cheat sheet", () => {
  // N = 2^15, r = 8, p = 3 (OWASP, Password Storage Cheat Sheet, scrypt).
  expect(SCRYPT_COST).toEqual({ logN: 15, r: 8, p: 3 });
});

it("knows the vector of RFC 7914, section 12", async () => {
  // scrypt("pleaseletmein", "SodiumChloride", N=16384, r=8, p=1, 64), of which the first 32 bytes are kept here.
  const key = Buffer.from("7023bdcb3afd7348461c06cd81fd38ebfda8fbba904f8e3ea9b543f6545da1f2", "hex");
  const salt = Buffer.from("SodiumChloride").toString("base64url");
  expect(await verifyPassword("pleaseletmein", `scrypt$14$8$1$${salt}$${key.toString("base64url")}`)).toBe(true);
});

it("gives the same password another hash each time, and knows it and no other", async () => {
  const [one, other] = [await hashPassword("a good password", CHEAP), await hashPassword("a good password", CHEAP)];
  expect(one).not.toBe(other);
  expect(await verifyPassword("a good password", one)).toBe(true);
  expect(await verifyPassword("a good passwore", one)).toBe(false);
  expect(await verifyPassword("", one)).toBe(false);
});

it("knows a password typed on another keyboard (NFKC)", async () => {
  expect(await verifyPassword("cafe\u0301 au lait", await hashPassword("caf\u00e9 au lait", CHEAP))).toBe(true);
});

it.each(["", "plain", "scrypt$4$8$1$$", "bcrypt$4$8$1$c2FsdA$a2V5"])(
  "takes nothing for a stored text like %j",
  async (stored) => {
    expect(await verifyPassword("plain", stored)).toBe(false);
  },
);

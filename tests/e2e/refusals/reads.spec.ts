import { expect } from "@playwright/test";
import { drafted, read } from "../support/http-acts";
import { bluff, content, revising } from "../support/http-bodies";
import { PRODUCT } from "../support/http-people";
import { nobody } from "../support/http-person";
import { test } from "../support/http-test";

const BASE = `/products/${PRODUCT}`;
const MEMBERS_READ = "Only those who hold a role in this product may read its";

test("a member of another product reads no page of this one", async ({ as }) => {
  const own = await read(await as("tansy"), `${BASE}/budget`);
  expect(own.status).toBe(200);
  expect(own.text).toContain("Mirror");
  for (const page of ["budget", "proposals", "history", "items/010"]) {
    const { status, text } = await read(await as("otto"), `${BASE}/${page}`);
    expect(status, page).toBe(403);
    expect(text, page).not.toContain("Mirror");
  }
});

test("a member of another product and who is signed out get no file and no figure", async ({ application, as }) => {
  const working = "workings?issue=2&point=OP-1&figure=predicted&of=total";
  const [otto, stranger] = [await as("otto"), nobody(application.address)];
  for (const [file, what] of [
    ["history", "history"],
    [working, "budget"],
  ] as const) {
    expect((await read(await as("maud"), `/api${BASE}/${file}`)).status, file).toBe(200);
    const refused = await read(otto, `/api${BASE}/${file}`);
    expect(refused.status, file).toBe(403);
    expect(JSON.parse(refused.text), file).toMatchObject({ code: "forbidden", sentence: `${MEMBERS_READ} ${what}.` });
    const signedOut = await read(stranger, `/api${BASE}/${file}`);
    expect(signedOut.status, file).toBe(401);
    expect(JSON.parse(signedOut.text), file).toMatchObject({ sentence: "You are signed out. Sign in again." });
  }
});

test("a draft is shown to nobody but its editors, not even to an auditor or a program manager", async ({ as }) => {
  const tansy = await as("tansy");
  const named = { ...content([revising("010", bluff(tansy.userId, 0.49))]), title: "Not told yet" };
  const { proposalId } = await drafted(tansy, named);
  const page = `${BASE}/proposals/draft-${proposalId}`;
  expect((await read(tansy, page)).text).toContain("Not told yet");
  for (const name of ["maud", "lusia", "odo", "ines"] as const) {
    for (const address of [page, `${page}/edit`, `${page}/patch`, `${BASE}/proposals`]) {
      const { status, text } = await read(await as(name), address);
      expect(status, `${name} ${address}`).toBeLessThan(500);
      expect(text, `${name} ${address}`).not.toContain("Not told yet");
    }
    expect((await read(await as(name), page)).status, name).toBe(403);
    expect((await read(await as(name), `${page}/patch`)).status, name).toBe(403);
  }
});

test("who is signed out is led to the sign-in page from every page", async ({ application }) => {
  for (const page of [
    "/",
    "/products",
    `${BASE}/budget`,
    `${BASE}/proposals`,
    "/administration/accounts",
    "/account",
  ]) {
    const { status, text } = await read(nobody(application.address), page);
    expect(text, page).not.toContain("Mirror");
    expect([307, 200], page).toContain(status);
    expect(text, page).toContain("/sign-in");
  }
});

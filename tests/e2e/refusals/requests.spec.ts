import { expect } from "@playwright/test";
import { z } from "zod";
import {
  drafted,
  endSessions,
  propose,
  proposed,
  saveDraft,
  sheetBefore,
  sign,
  startDraft,
} from "../support/http-acts";
import { routeAnswer, valueOf } from "../support/http-answer";
import { bluff, content, revising } from "../support/http-bodies";
import { PRODUCT } from "../support/http-people";
import { nobody, signInOverHttp } from "../support/http-person";
import { storedState } from "../support/http-tables";
import { test } from "../support/http-test";

const SIGNED_OUT = "You are signed out. Sign in again in another tab, then try again here: nothing typed is lost.";

test("who is signed out saves nothing, proposes nothing and signs nothing", async ({ application, as, refuses }) => {
  const tansy = await as("tansy");
  const change = content([revising("010", bluff(tansy.userId, 0.49))]);
  const draft = await drafted(tansy, change);
  const proposal = await proposed(tansy, change);
  const shown = await sheetBefore(await as("ines"), proposal);
  const stranger = nobody(application.address);

  const sentence = "You are signed out. Sign in again.";
  await refuses(() => saveDraft(stranger, { ...draft, content: change }), { code: "forbidden", status: 401, sentence });
  await refuses(() => propose(stranger, draft), { code: "forbidden", sentence: SIGNED_OUT });
  await refuses(() => sign(stranger, proposal, shown), { code: "forbidden", sentence: SIGNED_OUT });
  await refuses(() => startDraft(stranger), { code: "forbidden", sentence: SIGNED_OUT });
});

test("a cookie that was signed out elsewhere is worth nothing", async ({ application, refuses }) => {
  const wanda = await signInOverHttp(application.address, "wanda");
  valueOf(await endSessions(wanda), z.unknown());
  await refuses(() => startDraft(wanda), { code: "forbidden", sentence: SIGNED_OUT });
});

test("a wrong password signs nobody in", async ({ application }) => {
  const before = await storedState(application.dataFolder);
  await expect(signInOverHttp(application.address, "odo", "not my password")).rejects.toThrow("odo was not signed in");
  const after = await storedState(application.dataFolder);
  expect(after.tables).toEqual(before.tables);
  expect(after.history.slice(before.history.length)).toMatchObject([
    { act: "sign_in", outcome: "refused", reason: "E-mail address or password is wrong." },
  ]);
});

test("a write that another site sends is refused, and taken from a page of this address", async ({
  application,
  as,
  refuses,
}) => {
  const tansy = await as("tansy");
  const draft = await drafted(tansy, content([revising("010", bluff(tansy.userId, 0.49))]));
  const sentence = "This request did not come from a page of this address.";
  const foreign: Record<string, string>[] = [
    { origin: "https://elsewhere.example" },
    { origin: "null" },
    { "sec-fetch-site": "cross-site" },
  ];
  for (const headers of foreign) {
    const refused = { code: "invalid", status: 403, sentence };
    await refuses(() => propose(tansy, draft, { headers }), refused);
    await refuses(() => saveDraft(tansy, { ...draft, content: content([]) }, { headers }), refused);
  }
  const own = { origin: application.address, "sec-fetch-site": "same-origin" };
  valueOf(await propose(tansy, draft, { headers: own }), z.object({ round: z.literal(1) }));
});

test("a body of more than a megabyte is refused unread, and so is one that does not say how long it is", async ({
  application,
  as,
  refuses,
}) => {
  const tansy = await as("tansy");
  const draft = await drafted(tansy, content([]));
  const sentence = "This is longer than one megabyte. Shorten it and send it again.";
  const long = { ...content([]), reason: "x".repeat(1_100_000) };
  await refuses(() => saveDraft(tansy, { ...draft, content: long }), { code: "invalid", status: 413, sentence });
  await refuses(() => propose(tansy, draft, { key: "x".repeat(1_100_000) }), {
    code: "invalid",
    status: 413,
    sentence,
  });

  const unmeasured = async () => {
    const stream = {
      method: "PUT",
      headers: { "content-type": "application/json", cookie: tansy.cookie },
      body: new Blob([JSON.stringify({ ...draft, content: content([]) })]).stream(),
      duplex: "half",
    };
    return routeAnswer(
      await fetch(`${application.address}/api/products/${PRODUCT}/drafts/${draft.proposalId}`, stream),
    );
  };
  await refuses(unmeasured, { code: "invalid", status: 413, sentence });
});

test("a draft of more than half a megabyte is refused in words", async ({ as, refuses }) => {
  const tansy = await as("tansy");
  const draft = await drafted(tansy, content([]));
  const long = { ...content([]), reason: "x".repeat(600_000) };
  await refuses(() => saveDraft(tansy, { ...draft, content: long }), {
    code: "invalid",
    status: 400,
    sentence: "This is no JSON text, or it is too long.",
  });
});

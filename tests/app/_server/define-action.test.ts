import { beforeEach, describe, expect, it, vi } from "vitest";
import { z } from "zod";

import { defineAction } from "@/app/_server/define-action";
import { answerWrite } from "@/app/_server/route-problem";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";

const signedIn = vi.hoisted(() => ({ actor: null as unknown }));
vi.mock("@/app/_server/session", () => ({ currentActor: async () => signedIn.actor }));

const INES: Actor = { userId: 7, printedName: "Ines Quarrymead", isAdministrator: false, memberships: [] };

const RenameInput = z.strictObject({
  name: z.string().trim().min(2, "Give the product a name."),
  lines: z.array(z.object({ number: z.string().min(1, "Give the line a number.") })).default([]),
});

beforeEach(() => {
  signedIn.actor = INES;
});

describe("an action", () => {
  it("gives the command the signed-in person, the parsed input and a clock", async () => {
    const command = vi.fn(async (_actor: Actor, { name }: { name: string }) => name.length);
    const before = Date.now();

    const result = await defineAction(RenameInput, command)({ name: "  Skirt  " });

    expect(result).toEqual({ ok: true, value: 5 });
    const [actor, input] = command.mock.calls[0] ?? [];
    expect(actor).toBe(INES);
    expect(input).toEqual({ name: "Skirt", lines: [] });
    const clock: unknown = command.mock.lastCall?.at(2);
    expect(typeof clock === "function" && clock().getTime()).toBeGreaterThanOrEqual(before);
  });

  it("says at which field what would be right, and does not run the command", async () => {
    const command = vi.fn(async () => null);

    const result = await defineAction(RenameInput, command)({ name: "x", lines: [{ number: "010" }, { number: "" }] });

    expect(result).toEqual({
      ok: false,
      code: "invalid",
      sentence: "2 fields need another look.",
      faults: [
        { path: "name", sentence: "Give the product a name." },
        { path: "lines.1.number", sentence: "Give the line a number." },
      ],
    });
    expect(command).not.toHaveBeenCalled();
  });

  it("turns a refusal of the command into its code and sentence", async () => {
    const action = defineAction(RenameInput, async () => {
      throw new Refusal("overtaken", "Issue 14 changed this line. Carry it forward.");
    });

    expect(await action({ name: "Skirt" })).toMatchObject({
      ok: false,
      code: "overtaken",
      sentence: "Issue 14 changed this line. Carry it forward.",
    });
  });

  it("lets a fault of ours go on its way to the log instead of hiding it", async () => {
    const action = defineAction(RenameInput, async () => {
      throw new TypeError("no such column");
    });

    await expect(action({ name: "Skirt" })).rejects.toThrow("no such column");
  });

  it("runs nothing for who is signed out and says so without a redirect", async () => {
    signedIn.actor = null;
    const command = vi.fn(async () => null);

    const result = await defineAction(RenameInput, command)({ name: "Skirt" });

    expect(result).toMatchObject({ ok: false, code: "forbidden" });
    expect(command).not.toHaveBeenCalled();
  });
});

function write(body: string, headers: Record<string, string> = {}): Request {
  return new Request("http://127.0.0.1:4000/api/drafts/17", {
    method: "PUT",
    headers: { host: "127.0.0.1:4000", ...headers },
    body,
  });
}

describe("a write through a route", () => {
  const echo = async (_actor: Actor, input: { name: string }) => ({ renamed: input.name });

  it("answers 200 with the value", async () => {
    const answer = await answerWrite(write('{"name":"Skirt"}'), RenameInput, echo);

    expect(answer.status).toBe(200);
    expect(await answer.json()).toEqual({ renamed: "Skirt" });
  });

  it.each([
    ["forbidden", 403],
    ["not_found", 404],
    ["moved", 409],
    ["evaluation_refused", 422],
    ["too_many_attempts", 429],
  ] as const)("answers a refusal %s with %i", async (code, status) => {
    const answer = await answerWrite(write('{"name":"Skirt"}'), RenameInput, async () => {
      throw new Refusal(code, "No.");
    });

    expect(answer.status).toBe(status);
    expect(await answer.json()).toEqual({ code, sentence: "No.", faults: [] });
  });

  it("answers 400 for text that is no JSON and for input of the wrong shape", async () => {
    expect((await answerWrite(write("{"), RenameInput, echo)).status).toBe(400);
    expect((await answerWrite(write('{"name":"Skirt","role":"reviewer"}'), RenameInput, echo)).status).toBe(400);
  });

  it("answers 401 to who is signed out", async () => {
    signedIn.actor = null;

    expect((await answerWrite(write('{"name":"Skirt"}'), RenameInput, echo)).status).toBe(401);
  });

  it("answers 403 to a page of another site, whoever is signed in", async () => {
    const foreign = write('{"name":"Skirt"}', { origin: "https://elsewhere.example" });

    expect((await answerWrite(foreign, RenameInput, echo)).status).toBe(403);
  });
});

import { describe, expect, it } from "vitest";

import type { ActionResult } from "@/app/_server/action-result";
import { streamedAnswer, type Watch } from "@/app/_server/streamed-answer";

const REFUSED: ActionResult<never> = { ok: false, code: "duplicate", sentence: "It is there already.", faults: [] };

const open = () => new AbortController().signal;
const later = () => new Promise<void>((resolve) => setImmediate(resolve));

async function linesOf(response: Response): Promise<unknown[]> {
  return (await response.text())
    .trimEnd()
    .split("\n")
    .map((line) => JSON.parse(line));
}

describe("an answer that tells its progress", () => {
  it("gives every count as a line and the value last", async () => {
    const response = await streamedAnswer(open(), async ({ onProgress }) => {
      onProgress(500);
      await later();
      onProgress(1000);
      return { ok: true, value: { runId: 3 } };
    });
    expect(response.status).toBe(200);
    expect(await linesOf(response)).toEqual([
      { type: "progress", done: 500 },
      { type: "progress", done: 1000 },
      { type: "done", value: { runId: 3 } },
    ]);
  });

  it("is the status of its refusal where that comes before the first count", async () => {
    const response = await streamedAnswer(open(), async () => REFUSED);
    expect(response.status).toBe(409);
    expect(await response.json()).toEqual({ code: "duplicate", sentence: "It is there already.", faults: [] });
  });

  it("ends with the refusal as a line where that comes later", async () => {
    const response = await streamedAnswer(open(), async ({ onProgress }) => {
      onProgress(500);
      await later();
      return REFUSED;
    });
    expect((await linesOf(response)).at(-1)).toEqual({
      type: "refused",
      code: "duplicate",
      sentence: "It is there already.",
      faults: [],
    });
  });

  it("breaks off where the work breaks, before the first count and after it", async () => {
    const bug = new Error("a bug");
    await expect(streamedAnswer(open(), () => Promise.reject(bug))).rejects.toThrow("a bug");
    const begun = await streamedAnswer(open(), async ({ onProgress }) => {
      onProgress(500);
      await later();
      throw bug;
    });
    await expect(begun.text()).rejects.toThrow("a bug");
  });

  it("stops the work when its reader leaves, before the first count and after it", async () => {
    const stopped = ({ signal }: Watch) =>
      new Promise<ActionResult<unknown>>((_resolve, reject) => {
        signal.addEventListener("abort", () => reject(signal.reason));
      });
    const early = new AbortController();
    const waiting = streamedAnswer(early.signal, stopped);
    early.abort();
    expect((await waiting).status).toBe(499);

    let reason: unknown = null;
    const response = await streamedAnswer(open(), async (watch) => {
      watch.onProgress(500);
      return stopped(watch).catch((problem: unknown) => {
        reason = problem;
        throw problem;
      });
    });
    await response.body?.cancel();
    await later();
    expect(reason).toMatchObject({ name: "AbortError" });
  });
});

import { z } from "zod";

const Fault = z.object({ path: z.string(), sentence: z.string() });
const Refused = z.object({ code: z.string(), sentence: z.string(), faults: z.array(Fault) });
export type Refused = z.output<typeof Refused>;

const Line = z.discriminatedUnion("type", [
  z.object({ type: z.literal("progress"), done: z.int() }),
  z.object({ type: z.literal("done"), value: z.unknown() }),
  Refused.extend({ type: z.literal("refused") }),
]);
type Line = z.output<typeof Line>;

export const BROKEN_OFF: Refused = {
  code: "broken",
  sentence: "The run broke off and nothing was kept. Try again; if it breaks off again, tell the administrator.",
  faults: [],
};

export type Streamed = { ok: true; value: unknown } | { ok: false; refused: Refused };

/** Sends a write and reads its answer line by line; what is told on the way goes to the listener. */
export async function sendAndWatch(
  address: string,
  body: object,
  signal: AbortSignal,
  onProgress: (done: number) => void,
): Promise<Streamed> {
  const headers = { "content-type": "application/json" };
  const answer = await fetch(address, { method: "POST", headers, body: JSON.stringify(body), signal });
  if (!answer.ok) return { ok: false, refused: refusedOf(await answer.text()) };

  for await (const line of linesOf(answer)) {
    if (line.type === "progress") onProgress(line.done);
    else if (line.type === "done") return { ok: true, value: line.value };
    else return { ok: false, refused: line };
  }
  return { ok: false, refused: BROKEN_OFF };
}

async function* linesOf({ body }: Response): AsyncGenerator<Line, void> {
  const reader = body?.getReader();
  if (!reader) return;
  const decoder = new TextDecoder();
  let rest = "";
  for (let chunk = await reader.read(); !chunk.done; chunk = await reader.read()) {
    const lines = `${rest}${decoder.decode(chunk.value, { stream: true })}`.split("\n");
    rest = lines.pop() ?? "";
    for (const line of lines) yield Line.parse(JSON.parse(line));
  }
}

/** A refusal of ours is JSON with a sentence; a server that is broken answers with a page. */
function refusedOf(text: string): Refused {
  try {
    return Refused.catch(BROKEN_OFF).parse(JSON.parse(text));
  } catch {
    return BROKEN_OFF;
  }
}

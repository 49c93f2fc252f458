import type { z } from "zod";

import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";

import type { ActionResult } from "./action-result";
import { runCommand } from "./define-action";
import { readWrite, resultResponse } from "./route-problem";

/** What long work is given: it learns when who asked has left, and tells how much is done. */
export interface Watch {
  signal: AbortSignal;
  onProgress: (done: number) => void;
}

/** A line of the answer, as JSON. */
export type StreamedLine =
  | { type: "progress"; done: number }
  | { type: "done"; value: unknown }
  | ({ type: "refused" } & Omit<Extract<ActionResult<never>, { ok: false }>, "ok">);

/** Answers a write that takes long: same origin, signed in, parsed, then the command, with its progress line by line. */
export async function answerStreamed<Schema extends z.ZodType, Value>(
  request: Request,
  schema: Schema,
  command: (actor: Actor, input: z.output<Schema>, clock: Clock, watch: Watch) => Promise<Value>,
): Promise<Response> {
  const write = await readWrite(request);
  if (write instanceof Response) return write;

  return streamedAnswer(request.signal, (watch) =>
    runCommand(schema, (actor, input, clock) => command(actor, input, clock, watch), write.actor, write.body),
  );
}

/** Nobody reads it: the connection is gone. */
const CLIENT_LEFT = 499;

/** What is refused before the first progress is answered with its status; what comes later with a line. */
export async function streamedAnswer(
  requestSignal: AbortSignal,
  work: (watch: Watch) => Promise<ActionResult<unknown>>,
): Promise<Response> {
  const left = new AbortController();
  const signal = AbortSignal.any([requestSignal, left.signal]);
  const lines = lineStream(signal, () => left.abort());
  let begin = (): void => undefined;
  const begun = new Promise<null>((resolve) => (begin = () => resolve(null)));

  const result = work({
    signal,
    onProgress: (done) => {
      begin();
      lines.tell({ type: "progress", done });
    },
  });
  try {
    const early = await Promise.race([begun, result]);
    if (early && !early.ok) return resultResponse(early);
  } catch (problem) {
    if (signal.aborted) return new Response(null, { status: CLIENT_LEFT });
    throw problem;
  }

  result.then((answer) => {
    lines.tell(lastLine(answer));
    lines.end();
  }, lines.fail);

  return new Response(lines.stream, {
    // Untransformed: packed into blocks, progress would come late.
    headers: { "content-type": "application/x-ndjson; charset=utf-8", "cache-control": "no-store, no-transform" },
  });
}

function lastLine(answer: ActionResult<unknown>): StreamedLine {
  if (answer.ok) return { type: "done", value: answer.value };
  const { code, sentence, faults } = answer;
  return { type: "refused", code, sentence, faults };
}

interface LineStream {
  stream: ReadableStream<Uint8Array>;
  tell: (line: StreamedLine) => void;
  end: () => void;
  fail: (problem: unknown) => void;
}

/** After its reader has left nothing more is written. */
function lineStream(signal: AbortSignal, onLeave: () => void): LineStream {
  const encoder = new TextEncoder();
  let controller: ReadableStreamDefaultController<Uint8Array> | null = null;
  const stream = new ReadableStream<Uint8Array>({
    start: (opened) => {
      controller = opened;
    },
    cancel: onLeave,
  });
  const whileRead = (write: (open: ReadableStreamDefaultController<Uint8Array>) => void): void => {
    if (controller && !signal.aborted) write(controller);
  };
  return {
    stream,
    tell: (line) => whileRead((open) => open.enqueue(encoder.encode(`${JSON.stringify(line)}\n`))),
    end: () => whileRead((open) => open.close()),
    fail: (problem) => whileRead((open) => open.error(problem)),
  };
}

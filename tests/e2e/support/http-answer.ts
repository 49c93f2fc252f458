import { z } from "zod";

const Refused = z.object({
  code: z.string(),
  sentence: z.string(),
  faults: z.array(z.object({ path: z.string(), sentence: z.string() })),
});

/** What an action or a route answers, with its status. */
export type HttpAnswer =
  | { ok: true; status: number; value: unknown }
  | { ok: false; status: number; code: string; sentence: string; faults: { path: string; sentence: string }[] };

const ActionResult = z.discriminatedUnion("ok", [
  z.object({ ok: z.literal(true), value: z.unknown() }),
  Refused.extend({ ok: z.literal(false) }),
]);

/** A route's: the value as JSON, or the refusal with a status that says so. */
export async function routeAnswer(response: Response): Promise<HttpAnswer> {
  const { status } = response;
  const body: unknown = await response.json();
  return response.ok ? { ok: true, status, value: body } : { ok: false, status, ...Refused.parse(body) };
}

/** An action's: React's stream of rows, the first of which names the row that holds what the action returned. */
export async function actionAnswer(response: Response): Promise<HttpAnswer> {
  const { status } = response;
  // What stands before the pages answers in JSON, without asking the action.
  if (response.headers.get("content-type")?.startsWith("application/json")) return routeAnswer(response);

  const stream = await response.text();
  const rows = new Map(
    stream.split("\n").map((row) => [row.slice(0, row.indexOf(":")), row.slice(row.indexOf(":") + 1)]),
  );
  const head = rows.get("0");
  if (head === undefined) throw new Error(`The action answered ${status} with no stream: ${stream.slice(0, 200)}`);
  const { a: reference } = z.object({ a: z.string() }).parse(JSON.parse(head));
  const returned = rows.get(reference.replace("$@", ""));
  if (returned === undefined || !returned.startsWith("{"))
    throw new Error(`The action failed: ${stream.slice(0, 400)}`);
  return { status, ...ActionResult.parse(JSON.parse(returned)) };
}

/** The value of an act that has to succeed for the test to go on. */
export function valueOf<Shape extends z.ZodType>(answer: HttpAnswer, shape: Shape): z.output<Shape> {
  if (!answer.ok) throw new Error(`Refused with ${answer.code}: ${answer.sentence} ${JSON.stringify(answer.faults)}`);
  return shape.parse(answer.value);
}

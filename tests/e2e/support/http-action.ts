import { readFileSync } from "node:fs";
import path from "node:path";
import { z } from "zod";
import { actionAnswer, type HttpAnswer } from "./http-answer";
import type { HttpPerson } from "./http-person";

const Manifest = z.object({
  node: z.record(z.string(), z.object({ exportedName: z.string() })),
});

/** A server action by the name under which it is exported, and the page whose form sends it. */
export interface HttpAction {
  name: string;
  page: string;
}

/** Sends what a form sends: the page's address, the action's id in the build, and the input as React writes it. */
export async function callAction(
  { address, cookie }: HttpPerson,
  { name, page }: HttpAction,
  input: unknown,
  headers: Record<string, string> = {},
): Promise<HttpAnswer> {
  const response = await fetch(`${address}${page}`, {
    method: "POST",
    redirect: "manual",
    headers: {
      accept: "text/x-component",
      "content-type": "text/plain;charset=UTF-8",
      "next-action": actionId(name),
      cookie,
      ...headers,
    },
    body: JSON.stringify([input]),
  });
  return actionAnswer(response);
}

function actionId(name: string): string {
  const file = path.join(process.cwd(), ".next/server/server-reference-manifest.json");
  const { node } = Manifest.parse(JSON.parse(readFileSync(file, "utf8")));
  const ids = Object.entries(node).flatMap(([id, { exportedName }]) => (exportedName === name ? [id] : []));
  const [id] = ids;
  if (id === undefined || ids.length > 1) throw new Error(`The build holds ${ids.length} actions named ${name}.`);
  return id;
}

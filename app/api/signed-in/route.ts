import { answerRead } from "@/app/_server/route-problem";

/** Whether a session still stands, and nothing else: the least that a route of ours can answer. */
export async function GET() {
  return answerRead(() => Promise.resolve(null));
}

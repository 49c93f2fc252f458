import { unstable_rethrow } from "next/navigation";

import type { ActionResult } from "../_server/action-result";

const NO_ANSWER: ActionResult<never> = {
  ok: false,
  code: "invalid",
  sentence: "The server did not answer as it should. What you typed is still here: try again in a moment.",
  faults: [],
};

/** An action's answer; a broken line or a fault of the server becomes a sentence where the form can show it. */
export async function answerOf<Value>(action: Promise<ActionResult<Value>>): Promise<ActionResult<Value>> {
  try {
    return await action;
  } catch (error) {
    unstable_rethrow(error);
    // The server keeps its own record of what broke.
    return NO_ANSWER;
  }
}

import type { Quantity } from "../quantity";

/** A saving is at most 0, and nothing else may be below it. */
export function demandSign(
  saving: boolean,
  quantity: Quantity,
  field: string,
  context: { addIssue(issue: { code: "custom"; path: string[]; message: string }): void },
): void {
  if (saving ? quantity.value <= 0 : quantity.value >= 0) return;

  const message = saving ? "A saving is 0 or negative." : "Negative only on an item that is marked as a saving.";
  context.addIssue({ code: "custom", path: [field], message });
}

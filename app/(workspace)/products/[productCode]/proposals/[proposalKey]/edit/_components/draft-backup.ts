import { z } from "zod";

import { DraftContent } from "@/lib/proposals/schema";

/** What was typed, and the saved state of the draft that it was typed on. */
export const Backup = z.object({ lockVersion: z.int(), base: DraftContent, content: DraftContent });
export type Backup = z.output<typeof Backup>;

/** What this device keeps of a draft until the server has it. */
function keyOf(proposalId: number): string {
  return `leeboard draft ${proposalId}`;
}

export function keepBackup(proposalId: number, backup: Backup): void {
  try {
    window.localStorage.setItem(keyOf(proposalId), JSON.stringify(backup));
  } catch {
    // A full or forbidden store loses only the second copy; the server's is on its way, and is said to be.
  }
}

export function dropBackup(proposalId: number): void {
  window.localStorage.removeItem(keyOf(proposalId));
}

export function readBackup(proposalId: number): Backup | null {
  const text = window.localStorage.getItem(keyOf(proposalId));
  if (text === null) return null;
  try {
    const parsed = Backup.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

import { DraftContent } from "@/lib/proposals/schema";

/** What this device keeps of a draft until the server has it. */
function keyOf(proposalId: number): string {
  return `leeboard draft ${proposalId}`;
}

export function keepBackup(proposalId: number, content: DraftContent): void {
  try {
    window.localStorage.setItem(keyOf(proposalId), JSON.stringify(content));
  } catch (problem) {
    // A full or forbidden store loses only the second copy; the server's is on its way.
    console.warn("This device keeps no copy of the draft.", problem);
  }
}

export function dropBackup(proposalId: number): void {
  window.localStorage.removeItem(keyOf(proposalId));
}

export function readBackup(proposalId: number): DraftContent | null {
  const text = window.localStorage.getItem(keyOf(proposalId));
  if (text === null) return null;
  try {
    const parsed = DraftContent.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

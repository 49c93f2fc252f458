import { passwordRefusal } from "@/lib/users/password-refusal";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal, type RefusalCode } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { openedTexts } from "../records/opened-texts";
import type { SignSheetsInput } from "../schema";
import { signSheet, type SignedProposal } from "./sign-proposal";

export interface SignedSheets {
  signed: ({ proposalId: number } & SignedProposal)[];
  /** Sheets that could not be signed, for example because a signature before it moved the effect. */
  refused: { proposalId: number; code: RefusalCode; sentence: string }[];
}

/**
 * Approves several sheets that were each opened, one after another under one password. Each is an act of its own: what
 * one of them is refused for keeps no other from being signed.
 */
export async function signSheets(
  actor: Actor,
  { sheets, password }: SignSheetsInput,
  clock: Clock = systemClock,
): Promise<SignedSheets> {
  const wrongPassword = await passwordRefusal(actor.userId, password);
  const hashes = sheets.map(({ textHash }) => textHash);
  const opened = await inSnapshot((tx) => openedTexts(actor.userId, hashes, tx));
  const answer: SignedSheets = { signed: [], refused: [] };
  for (const sheet of sheets) {
    const { proposalId, textHash } = sheet;
    try {
      const objection = wrongPassword ?? (opened.has(textHash) ? null : notOpened());
      answer.signed.push({ proposalId, ...(await signSheet(actor, sheet, objection, clock)) });
    } catch (problem) {
      if (!(problem instanceof Refusal) || problem === wrongPassword) throw problem;
      answer.refused.push({ proposalId, code: problem.code, sentence: problem.message });
    }
  }
  return answer;
}

function notOpened(): Refusal {
  return new Refusal("moved", "Open this sheet and read it before you sign it together with others.");
}

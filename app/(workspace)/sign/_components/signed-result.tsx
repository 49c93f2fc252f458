import { Notice } from "@/app/_components/notice";
import type { SignedSheets } from "@/lib/proposals/signing/sign-sheets";

interface SignedResultProps {
  answer: SignedSheets;
  labels: ReadonlyMap<number, string>;
}

/** What came of it, sheet by sheet. */
export function SignedResult({ answer, labels }: SignedResultProps) {
  return (
    <div className="mb-4 space-y-2" role="status">
      {answer.signed.map(({ proposalId, issue }) => (
        <Notice key={proposalId} kind="done">
          {labels.get(proposalId)} is signed
          {issue === null ? "; others have still to sign it." : `: it made issue ${issue}.`}
        </Notice>
      ))}
      {answer.refused.map(({ proposalId, sentence }) => (
        <Notice key={proposalId} kind="caution">
          {labels.get(proposalId)} is not signed. {sentence}
        </Notice>
      ))}
    </div>
  );
}

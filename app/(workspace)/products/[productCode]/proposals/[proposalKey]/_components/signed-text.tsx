import type { SigningSheetView } from "@/lib/proposals/views";

/** The text that a signature is bound to, to be read before signing. */
export function SignedText({ sheet }: { sheet: SigningSheetView }) {
  return (
    <details className="border-y border-rule py-2">
      <summary className="font-medium">
        The text you sign <span className="font-code text-xs text-ink-2">{sheet.textHash.slice(0, 12)}</span>
      </summary>
      <pre className="mt-2 max-h-72 overflow-auto font-code text-xs whitespace-pre-wrap">{sheet.text}</pre>
      <p className="mt-1 font-code text-2xs break-all text-ink-2">SHA-256 {sheet.textHash}</p>
    </details>
  );
}

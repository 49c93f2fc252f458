"use client";

import { TextArea } from "@/app/_components/text-area";
import { asList, asRecord } from "@/app/_components/line-fields/body";
import type { JustificationNeed } from "@/lib/proposals/review/change-checks";
import type { DraftEdit } from "@/lib/proposals/schema";

interface JustificationsFormProps {
  needs: readonly JustificationNeed[];
  edits: readonly DraftEdit[];
  onChange: (index: number, edit: DraftEdit) => void;
}

/** Notes that may stand only with a reason, each asked where it is read. */
export function JustificationsForm({ needs, edits, onChange }: JustificationsFormProps) {
  if (needs.length === 0) return null;

  return (
    <section aria-labelledby="justifications" className="mt-6">
      <h2 id="justifications" className="text-lg">
        Justifications
      </h2>
      <p className="mb-2 text-sm text-ink-2">These notes may stand if you say why. The reason stays with the item.</p>
      {needs.map((need) => {
        const edit = edits[need.edit];
        if (!edit) return null;

        return (
          <div key={`${need.item} ${need.code}`} className="mb-3 max-w-2xl">
            <TextArea
              label={`${need.item}: ${need.sentence}`}
              rows={2}
              maxLength={1000}
              value={given(edit, need.code)}
              onChange={(event) => onChange(need.edit, withJustification(edit, need, event.target.value))}
              error={
                need.isMet || given(edit, need.code) === "" ? undefined : "The note has grown: confirm the reason."
              }
            />
          </div>
        );
      })}
    </section>
  );
}

function given(edit: DraftEdit, code: string): string {
  const found = asList(edit.body?.justifications).find((justification) => justification.code === code);

  return typeof found?.text === "string" ? found.text : "";
}

/** The reason covers what the note exceeds now; cleared, it is gone. */
function withJustification(edit: DraftEdit, { code, excess }: JustificationNeed, text: string): DraftEdit {
  const others = asList(edit.body?.justifications).filter((justification) => justification.code !== code);
  const justifications = text === "" ? others : [...others, { code, text, excess }];

  return { ...edit, body: { ...asRecord(edit.body), justifications } };
}

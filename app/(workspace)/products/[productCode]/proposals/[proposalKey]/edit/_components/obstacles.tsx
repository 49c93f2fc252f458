"use client";

import { namedFault } from "@/lib/evaluation/lines/named-fault";
import type { Obstacle } from "@/lib/proposals/review/preview-proposal";
import type { DraftEdit } from "@/lib/proposals/schema";

interface ObstaclesProps {
  edits: readonly DraftEdit[];
  obstacles: readonly Obstacle[];
  hasReason: boolean;
  strict: boolean;
  onShow: () => void;
}

/** What still keeps the draft from being proposed; each sentence leads to its field. */
export function Obstacles({ edits, obstacles, hasReason, strict, onShow }: ObstaclesProps) {
  const all = [
    ...obstacles.map((obstacle) => ({ target: targetOf(obstacle.path), sentence: namedFault(edits, obstacle) })),
    ...(hasReason ? [] : [{ target: "reason", sentence: "Say why: the reason is still empty." }]),
  ];
  if (all.length === 0) return <p className="mt-6 text-sm">Nothing keeps it from being proposed.</p>;

  return (
    <section aria-labelledby="obstacles" className="mt-6">
      <h2 id="obstacles" className="text-lg">
        Before it can be proposed
      </h2>
      <ul className="mt-1 border-t border-ink text-sm">
        {all.map(({ target, sentence }) => (
          <li key={`${target} ${sentence}`} className="border-b border-rule py-1.5">
            {target ? (
              <a className="link" href={`#${target}`} onClick={onShow}>
                {sentence}
              </a>
            ) : (
              sentence
            )}
          </li>
        ))}
      </ul>
      {strict ? null : (
        <button type="button" className="link mt-1 min-h-6 text-sm" onClick={onShow}>
          Mark them at their fields
        </button>
      )}
    </section>
  );
}

/** "edits.0.body.length.value" stands at the control "edit-0-length". */
function targetOf(path: string): string | null {
  const [, edit, field] = /^edits\.(\d+)\.body\.([A-Za-z]+)/.exec(path) ?? [];
  if (edit === undefined || field === undefined) return null;

  return field === "justifications" ? "justifications" : `edit-${edit}-${field}`;
}

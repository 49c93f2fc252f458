"use client";

import { useState } from "react";

import { MarkdownEditor } from "@/app/_components/markdown-editor";
import { Notice } from "@/app/_components/notice";
import { SectionHeading } from "@/app/_components/section-heading";
import { TextField } from "@/app/_components/text-field";
import { type FileShelf, linesToName, type ShelvedFile } from "@/app/_components/line-fields/editor-names";
import { bodyBefore } from "@/app/_components/line-fields/new-edit";
import type { EditorView } from "@/lib/proposals/reading/editor-view";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";
import type { Preferences } from "@/lib/vocabulary/measures";

import { AdoptVersionForm } from "./adopt-version-form";
import { CoEditors } from "./co-editors";
import { EffectPanel } from "./effect-panel";
import { JustificationsForm } from "./justifications-form";
import { LineChooser } from "./line-chooser";
import { LineForm } from "./line-form";
import { Obstacles } from "./obstacles";
import { ProposeDialog } from "./propose-dialog";
import { RoutingPanel } from "./routing-panel";
import { MovedNotice } from "./moved-notice";
import { SaveWords } from "./save-words";
import { TouchedElsewhere } from "./touched-elsewhere";
import { TransfersForm } from "./transfers-form";
import { usePreview } from "./use-preview";
import { useSavedDraft } from "./use-saved-draft";

interface ProposalEditorProps {
  view: EditorView;
  /** In what the person likes to read: the effects stand in it, what is typed is typed in any unit. */
  preferences: Preferences;
}

/** The working copy of a proposal: its lines as forms, and beside them what they do. */
export function ProposalEditor({ view, preferences }: ProposalEditorProps) {
  const { draft, budget } = view;
  const { content, setContent, save, lockVersion, settle, touched, touchedElsewhere } = useSavedDraft(draft);
  const preview = usePreview(view, content);
  const [strict, setStrict] = useState(false);

  return (
    <div className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <div className="min-w-0">
        {draft.warning ? <Notice kind="caution">{draft.warning}</Notice> : null}
        {save.state === "moved" ? (
          <MovedNotice base={save.base} mine={content} stored={save.stored} people={view.people} settle={settle} />
        ) : null}
        <Heading content={content} setContent={setContent} faults={save.state === "failed" ? save.faults : []} />
        <Lines
          view={view}
          content={content}
          setContent={setContent}
          preview={preview}
          strict={strict}
          touched={touched}
        />
      </div>
      <aside className="min-w-0 lg:sticky lg:top-4 lg:max-h-[calc(100dvh-2rem)] lg:self-start lg:overflow-y-auto lg:border-l lg:border-rule lg:pl-6">
        <SaveWords save={save} />
        <EffectPanel preview={preview} budget={budget} edits={content.edits} preferences={preferences} />
        <RoutingPanel preview={preview} />
        <TouchedElsewhere lines={touchedElsewhere} productCode={draft.productCode} />
        <CoEditors draft={draft} isProposer={draft.proposer.id === view.me.userId} />
        <Obstacles
          edits={content.edits}
          obstacles={preview.obstacles}
          hasReason={content.reason.trim() !== ""}
          strict={strict}
          onShow={() => setStrict(true)}
        />
        <div className="mt-4">
          <ProposeDialog
            draft={draft}
            lockVersion={lockVersion}
            preview={preview}
            disabled={save.state !== "saved" || preview.obstacles.length > 0 || content.reason.trim() === ""}
          />
        </div>
      </aside>
    </div>
  );
}

interface PartProps {
  content: DraftContent;
  setContent: (change: (content: DraftContent) => DraftContent) => void;
}

function Heading({
  content,
  setContent,
  faults,
}: PartProps & { faults: readonly { path: string; sentence: string }[] }) {
  const faultAt = (path: string) => faults.find((fault) => fault.path === `content.${path}`)?.sentence;

  return (
    <div className="grid gap-4 sm:grid-cols-[minmax(0,1fr)_12rem]">
      <TextField
        label="Title"
        value={content.title}
        maxLength={120}
        onChange={(event) => setContent((old) => ({ ...old, title: event.target.value }))}
        error={faultAt("title")}
      />
      <TextField
        label="Needed by"
        type="date"
        optional
        value={content.neededBy ?? ""}
        onChange={(event) =>
          setContent((old) => ({ ...old, neededBy: event.target.value === "" ? null : event.target.value }))
        }
        error={faultAt("neededBy")}
      />
      <div className="sm:col-span-full">
        <MarkdownEditor
          id="reason"
          label="Reason"
          hint="Why the change is right: what was measured, drawn or decided. Headings, lists and tables can be used."
          value={content.reason}
          onChange={(reason) => setContent((old) => ({ ...old, reason }))}
          error={faultAt("reason")}
          height={160}
        />
      </div>
    </div>
  );
}

interface LinesProps extends PartProps {
  view: EditorView;
  preview: ReturnType<typeof usePreview>;
  strict: boolean;
  touched: DraftView["touched"];
}

function Lines({ view, content, setContent, preview, strict, touched }: LinesProps) {
  const { state } = view.budget;
  const files = useFileShelf(view);
  const names = { lines: linesToName(state, content.edits), people: view.people, owners: view.owners, files };
  const setEdits = (change: (edits: DraftContent["edits"]) => DraftContent["edits"]) =>
    setContent((old) => ({ ...old, edits: change(old.edits) }));
  const replace = (at: number, edit: DraftContent["edits"][number]) =>
    setEdits((edits) => edits.map((old, index) => (index === at ? edit : old)));

  return (
    <>
      <SectionHeading aside={content.edits.length || ""}>Lines</SectionHeading>
      {content.edits.map((edit, at) => (
        <LineForm
          key={`${edit.kind} ${edit.operation} ${at}`}
          edit={edit}
          index={at}
          onChange={(changed) => replace(at, changed)}
          onRemove={() => setEdits((edits) => edits.filter((_, index) => index !== at))}
          names={names}
          state={state}
          faults={preview.obstacles}
          strict={strict}
          before={bodyBefore(edit, state)}
          touched={touched.filter(({ line, by }) => line === `${edit.kind} ${edit.number}` && by.id !== view.me.userId)}
        />
      ))}
      <LineChooser
        state={state}
        edits={content.edits}
        me={view.me}
        onAdd={(edit) => setEdits((edits) => [...edits, edit])}
      />
      <AdoptVersionForm state={state} edits={content.edits} me={view.me} onAdopt={(edits) => setEdits(() => edits)} />
      <JustificationsForm needs={preview.justifications} edits={content.edits} onChange={replace} />
      <SectionHeading aside={content.transfers.length || ""}>Transfers of allocation</SectionHeading>
      <TransfersForm
        transfers={content.transfers}
        onChange={(transfers) => setContent((old) => ({ ...old, transfers }))}
        names={names}
        faults={preview.obstacles}
      />
    </>
  );
}

/** The product's files, and those that this page adds. */
function useFileShelf({ draft, files }: EditorView): FileShelf {
  const [held, setHeld] = useState<readonly ShelvedFile[]>(files);
  const { productCode, proposalId } = draft;
  const onAdded = (file: ShelvedFile) =>
    setHeld((old) => [file, ...old.filter(({ sha256 }) => sha256 !== file.sha256)]);

  return { productCode, proposalId, held, onAdded };
}

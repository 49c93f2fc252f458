"use client";

import dynamic from "next/dynamic";
import { cloneElement, isValidElement, type ReactElement, type SVGProps } from "react";
import rehypeSanitize from "rehype-sanitize";

import "@uiw/react-md-editor/markdown-editor.css";
import "./markdown-editor.css";

import { Field, type FieldTexts } from "./field";

const Editor = dynamic(() => import("@uiw/react-md-editor/nohighlight"), {
  ssr: false,
  loading: () => <div className="h-48 border border-rule-strong bg-sheet p-2.5 text-ink-2">Opening the editor…</div>,
});

interface MarkdownEditorProps extends FieldTexts {
  value: string;
  onChange: (text: string) => void;
  id?: string;
  /** Height in pixels. */
  height?: number;
  maxLength?: number;
  disabled?: boolean;
}

/** Writing with headings, lists and tables; the preview is sanitised and shows no pictures. */
export function MarkdownEditor({ label, hint, error, optional, id, value, onChange, ...rest }: MarkdownEditorProps) {
  const { height = 200, maxLength = 20_000, disabled } = rest;

  return (
    <Field label={label} hint={hint} error={error} optional={optional} id={id}>
      {(aria) => (
        <Editor
          value={value}
          onChange={(text) => onChange(text ?? "")}
          height={height}
          preview="edit"
          visibleDragbar={false}
          // Tab moves on, as everywhere else on the page.
          defaultTabEnable
          commandsFilter={(command) => !UNWANTED.has(command.name ?? "") && { ...command, icon: quiet(command.icon) }}
          previewOptions={{ rehypePlugins: [[rehypeSanitize]], disallowedElements: ["img"], unwrapDisallowed: true }}
          textareaProps={{ ...aria, maxLength, disabled }}
        />
      )}
    </Field>
  );
}

/** The toolbar's buttons have names; their drawings are not to be read out. */
function quiet(icon: ReactElement | undefined): ReactElement | undefined {
  if (!isValidElement<SVGProps<SVGSVGElement>>(icon)) return icon;

  return cloneElement(icon, { "aria-hidden": true, role: "presentation" });
}

const UNWANTED = new Set(["image", "fullscreen", "live", "comment", "help", "issue", "hr"]);

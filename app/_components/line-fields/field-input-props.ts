import type { ReactNode } from "react";

import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";

import type { Body, Json } from "./body";
import type { EditorNames } from "./editor-names";

export interface FieldInputProps {
  spec: FieldSpec;
  value: Json | undefined;
  onChange: (value: Json) => void;
  names: EditorNames;
  /** Sentence at this field, or at a part of it by its path: "evidence.0.date". */
  faultAt: (path: string) => string | undefined;
  /** Path of the field within its body. */
  path: string;
  /** The list entry that the field belongs to: choosing a file may fill in what the entry lacks. */
  entry?: { row: Body; onChange: (row: Body) => void };
  /** Id of the control, so that a fault listed elsewhere can lead to it. */
  id: string;
}

/** Draws a field inside a list or a record. */
export type RenderField = (props: FieldInputProps) => ReactNode;

"use server";

import { defineAction } from "@/app/_server/define-action";
import { saveDraft } from "@/lib/proposals/save-draft";
import { SaveDraftInput, StartDraftInput } from "@/lib/proposals/schema";
import { startDraft } from "@/lib/proposals/start-draft";

export const startDraftAction = defineAction(StartDraftInput, startDraft);
export const saveDraftAction = defineAction(SaveDraftInput, saveDraft);

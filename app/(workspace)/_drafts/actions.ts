"use server";

import { defineAction } from "@/app/_server/define-action";
import { StartDraftInput } from "@/lib/proposals/schema";
import { startDraft } from "@/lib/proposals/drafting/start-draft";

export const startDraftAction = defineAction(StartDraftInput, startDraft);

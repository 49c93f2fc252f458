"use server";

import { defineAction } from "@/app/_server/define-action";
import { propose } from "@/lib/proposals/submitting/propose";
import { ProposeInput, ShareDraftInput } from "@/lib/proposals/schema";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { unshareDraft } from "@/lib/proposals/drafting/unshare-draft";

export const proposeAction = defineAction(ProposeInput, propose);
export const shareDraftAction = defineAction(ShareDraftInput, shareDraft);
export const unshareDraftAction = defineAction(ShareDraftInput, unshareDraft);

"use server";

import { defineAction } from "@/app/_server/define-action";
import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { nameReviewer } from "@/lib/proposals/signing/name-reviewer";
import { openLineHistory } from "@/lib/proposals/reading/open-line-history";
import { raiseObjection } from "@/lib/proposals/signing/raise-objection";
import { returnProposal } from "@/lib/proposals/signing/return-proposal";
import {
  AddRemarkInput,
  NameReviewerInput,
  OpenLineHistoryInput,
  RaiseObjectionInput,
  ReturnProposalInput,
  SettleRemarkInput,
  SignProposalInput,
  TakeBackApprovalInput,
  WithdrawProposalInput,
} from "@/lib/proposals/schema";
import { settleRemark } from "@/lib/proposals/remarks/settle-remark";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { takeBackApproval } from "@/lib/proposals/signing/take-back-approval";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";

export const addRemarkAction = defineAction(AddRemarkInput, addRemark);
export const settleRemarkAction = defineAction(SettleRemarkInput, settleRemark);
export const signProposalAction = defineAction(SignProposalInput, signProposal);
export const returnProposalAction = defineAction(ReturnProposalInput, returnProposal);
export const takeBackApprovalAction = defineAction(TakeBackApprovalInput, takeBackApproval);
export const withdrawProposalAction = defineAction(WithdrawProposalInput, withdrawProposal);
export const raiseObjectionAction = defineAction(RaiseObjectionInput, raiseObjection);
export const nameReviewerAction = defineAction(NameReviewerInput, nameReviewer);
/** A read, but one that is noted: a request of its own that no link or prefetch can make. */
export const openLineHistoryAction = defineAction(OpenLineHistoryInput, openLineHistory);

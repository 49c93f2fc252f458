"use server";

import { defineAction } from "@/app/_server/define-action";
import { addRemark } from "@/lib/proposals/add-remark";
import { nameReviewer } from "@/lib/proposals/name-reviewer";
import { openLineHistory } from "@/lib/proposals/open-line-history";
import { raiseObjection } from "@/lib/proposals/raise-objection";
import { returnProposal } from "@/lib/proposals/return-proposal";
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
import { settleRemark } from "@/lib/proposals/settle-remark";
import { signProposal } from "@/lib/proposals/sign-proposal";
import { takeBackApproval } from "@/lib/proposals/take-back-approval";
import { withdrawProposal } from "@/lib/proposals/withdraw-proposal";

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

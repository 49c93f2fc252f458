"use server";

import { z } from "zod";

import { defineAction } from "@/app/_server/define-action";
import { createAccount } from "@/lib/products/create-account";
import { deactivateAccount } from "@/lib/products/deactivate-account";
import { reactivateAccount } from "@/lib/products/reactivate-account";
import { CreateAccountInput, DeactivateAccountInput } from "@/lib/products/schema";

export const createAccountAction = defineAction(CreateAccountInput, createAccount);

export const deactivateAccountAction = defineAction(DeactivateAccountInput, deactivateAccount);

const ReactivateAccountInput = DeactivateAccountInput.extend({
  reason: z
    .string()
    .trim()
    .min(3, "Say in a sentence why the account is opened again.")
    .pipe(DeactivateAccountInput.shape.reason),
});

export const reactivateAccountAction = defineAction(ReactivateAccountInput, reactivateAccount);

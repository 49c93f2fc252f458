"use server";

import { z } from "zod";

import { defineAction } from "@/app/_server/define-action";
import { changePassword } from "@/lib/accounts/change-password";
import { keepPreferences } from "@/lib/accounts/keep-preferences";
import { ChangePasswordInput, KeepPreferencesInput } from "@/lib/accounts/schema";
import { endSessions } from "@/lib/accounts/sign-out";

export const changePasswordAction = defineAction(ChangePasswordInput, async (actor, input, clock) => {
  await changePassword(actor, input, clock);
});

export const endSessionsAction = defineAction(z.strictObject({}), (actor, _input, clock) => endSessions(actor, clock));

export const keepPreferencesAction = defineAction(KeepPreferencesInput, (actor, input) =>
  keepPreferences(actor, input),
);

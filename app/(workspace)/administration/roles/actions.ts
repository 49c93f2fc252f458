"use server";

import { defineAction } from "@/app/_server/define-action";
import { endRole } from "@/lib/products/end-role";
import { giveRole } from "@/lib/products/give-role";
import { EndRoleInput, GiveRoleInput } from "@/lib/products/schema";

export const giveRoleAction = defineAction(GiveRoleInput, (actor, input, clock) => giveRole(actor, clock, input));

export const endRoleAction = defineAction(EndRoleInput, (actor, input, clock) => endRole(actor, clock, input));

"use server";

import { defineAction } from "@/app/_server/define-action";
import { endRole } from "@/lib/products/end-role";
import { giveRole } from "@/lib/products/give-role";
import { EndRoleInput, GiveRoleInput } from "@/lib/products/schema";

export const giveRoleAction = defineAction(GiveRoleInput, giveRole);

export const endRoleAction = defineAction(EndRoleInput, endRole);

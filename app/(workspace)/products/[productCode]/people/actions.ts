"use server";

import { defineAction } from "@/app/_server/define-action";
import { endDeputy } from "@/lib/products/end-deputy";
import { nameDeputy } from "@/lib/products/name-deputy";
import { EndDeputyInput, NameDeputyInput } from "@/lib/products/schema";

export const nameDeputyAction = defineAction(NameDeputyInput, nameDeputy);
export const endDeputyAction = defineAction(EndDeputyInput, endDeputy);

"use server";

import { defineAction } from "@/app/_server/define-action";
import { establishProduct } from "@/lib/products/establish-product";
import { EstablishProductInput } from "@/lib/products/schema";

export const establishAction = defineAction(EstablishProductInput, establishProduct);

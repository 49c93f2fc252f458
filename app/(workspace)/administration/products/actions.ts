"use server";

import { defineAction } from "@/app/_server/define-action";
import { createProduct } from "@/lib/products/create-product";
import { CreateProductInput } from "@/lib/products/schema";

export const createProductAction = defineAction(CreateProductInput, createProduct);

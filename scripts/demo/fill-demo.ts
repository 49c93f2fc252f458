import { createProduct } from "@/lib/products/create-product";
import { establishProduct } from "@/lib/products/establish-product";
import { giveRole } from "@/lib/products/give-role";
import type { CreateProductInput } from "@/lib/products/schema";
import { tellDuctStory } from "./duct-story";
import { tellFairingStory } from "./fairing-story";
import { openDemoHouse, type DemoHouse } from "./demo-house";
import { DEMO_ADMINISTRATOR, DEMO_PASSWORD, DEMO_ROLES } from "./people";
import { DUCT, FAIRING, SIGN, type DemoProduct } from "./products";
import { tellSignStory } from "./sign-story";

/** Everything in the demo is done by commands, as people would, on days before the one on which it is filled. */
export async function fillDemo(filledAt: Date): Promise<void> {
  const house = await openDemoHouse(filledAt, 168);
  for (const { product, firstDay, ...first } of [FAIRING, DUCT, SIGN]) {
    house.at(firstDay, "08:00");
    await openProduct(house, product);
    await establish(house, product.code, first);
  }
  await tellFairingStory(house);
  await tellDuctStory(house);
  await tellSignStory(house);
}

async function openProduct(house: DemoHouse, product: CreateProductInput): Promise<void> {
  const administrator = await house.actor(DEMO_ADMINISTRATOR);
  await createProduct(administrator, product, house.clock);
  for (const { person, roles } of DEMO_ROLES) {
    for (const role of roles) {
      const given = { productCode: product.code, userId: house.idOf(person), role, reason: "Demo." };
      await giveRole(administrator, given, house.clock);
    }
  }
}

async function establish(
  house: DemoHouse,
  productCode: string,
  { operatingPoint, terms }: Pick<DemoProduct, "operatingPoint" | "terms">,
): Promise<void> {
  const manager = await house.actor("lusia");
  const signed = { productCode, operatingPoint: { number: "OP-1", body: operatingPoint }, terms };
  await establishProduct(manager, { ...signed, password: DEMO_PASSWORD }, house.clock);
}

import { performAct } from "@/lib/audit/perform-act";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Product } from "@/models/product";
import { authorize } from "@/policies/authorize";
import type { CreateProductInput } from "./schema";

/** Makes a product without a budget: a program manager establishes it later. Its code is never given twice. */
export function createProduct(
  actor: Actor,
  { code, name, kind, timeZone }: CreateProductInput,
  clock: Clock,
): Promise<{ id: number; code: string }> {
  const subject = { type: "product", id: code, label: `${code} ${name}` };
  return performAct(actor, clock, { act: "create_product", chain: HOUSE_CHAIN, subject }, async (tx, record, at) => {
    authorize(actor, { on: "Installation", action: "create_product" });
    if ((await Product.count({ where: { code }, transaction: tx })) > 0) {
      const sentence = `There is a product ${code} already; a code is never given twice.`;
      throw new Refusal("duplicate", sentence, [{ path: "code", sentence }]);
    }
    const product = await Product.create({ code, name, kind, timeZone, createdAt: at }, { transaction: tx });
    record({ act: "create_product", subject, now: { code, name, kind, timeZone } });
    return { id: product.id, code };
  });
}

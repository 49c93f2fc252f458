import { giveRole } from "@/lib/products/give-role";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Role } from "@/lib/vocabulary/roles";
import { inTransaction } from "@/models/database";
import { Product } from "@/models/product";
import { User } from "@/models/user";

/** Rows made without a command: for tests whose subject is another command. */
export async function person(
  name: string,
  { isAdministrator = false, passwordHash = "none" }: { isAdministrator?: boolean; passwordHash?: string } = {},
): Promise<Actor> {
  const email = `${name.toLowerCase().replaceAll(/[^a-z]+/g, ".")}@example.org`;
  const row = await inTransaction((tx) =>
    User.create(
      { email, name, passwordHash, isAdministrator, createdAt: "2026-01-01T00:00:00.000Z" },
      { transaction: tx },
    ),
  );
  return { userId: row.id, printedName: name, isAdministrator, memberships: [] };
}

/** Gives a role by its command, so that the history is whole, and answers the person as they are signed in afterwards. */
export async function withRole(actor: Actor, productCode: string, role: Role): Promise<Actor> {
  const clock = () => new Date("2026-01-01T00:00:00.000Z");
  await giveRole({ ...actor, isAdministrator: true }, { productCode, userId: actor.userId, role, reason: "" }, clock);
  const { id: productId } = await Product.findOne({ where: { code: productCode }, rejectOnEmpty: true });
  return { ...actor, memberships: [...actor.memberships, { productId, role }] };
}

export async function product(code: string, kind: Product["kind"] = "vehicle_fairing"): Promise<number> {
  const row = await inTransaction((tx) =>
    Product.create(
      { code, name: `Product ${code}`, kind, timeZone: "Europe/Amsterdam", createdAt: "2026-01-01T00:00:00.000Z" },
      { transaction: tx },
    ),
  );
  return row.id;
}

import { QueryTypes, type Transaction } from "sequelize";
import { ROLES, type Role } from "@/lib/vocabulary/roles";
import { database } from "@/models/database";
import type { Deputyship, Member } from "@/policies/signing-rights";
import type { PersonName } from "./views";

/** Persons who hold a role in the product at that moment and whose account is open, by name. */
export async function membersAt(productId: number, at: string, tx: Transaction): Promise<Member[]> {
  const rows = await database.query<{ userId: number; printedName: string; roles: string }>(
    `SELECT u.id AS userId, u.name AS printedName, group_concat(m.role) AS roles
     FROM memberships m JOIN users u ON u.id = m.user_id
     WHERE m.product_id = :productId AND u.active = 1
       AND m.from_at <= :at AND (m.until_at IS NULL OR m.until_at > :at)
     GROUP BY u.id ORDER BY u.name, u.id`,
    { type: QueryTypes.SELECT, replacements: { productId, at }, transaction: tx },
  );
  return rows.map(({ userId, printedName, roles }) => ({
    userId,
    printedName,
    roles: roles.split(",").filter(isRole),
  }));
}

/** Deputies named for that day (of the product's calendar) and not ended before. */
export async function deputiesOn(productId: number, day: string, tx: Transaction): Promise<Deputyship[]> {
  return database.query<Deputyship>(
    `SELECT deputy_id AS deputyId, holder_id AS forUserId FROM deputies
     WHERE product_id = :productId AND from_day <= :day AND until_day >= :day AND ended_at IS NULL`,
    { type: QueryTypes.SELECT, replacements: { productId, day }, transaction: tx },
  );
}

/** Everybody who ever held a role here: the names that lines of any issue can refer to. */
export async function namesOf(productId: number, tx: Transaction): Promise<PersonName[]> {
  return database.query<PersonName>(
    `SELECT DISTINCT u.id, u.name FROM memberships m JOIN users u ON u.id = m.user_id
     WHERE m.product_id = :productId ORDER BY u.name, u.id`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
}

function isRole(value: string): value is Role {
  return ROLES.some((role) => role === value);
}

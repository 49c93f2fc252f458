import { Op, type Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Preferences } from "@/lib/vocabulary/measures";
import { Membership } from "@/models/membership";
import { User } from "@/models/user";
import { parsePreferences } from "./preferences";

/** An open account as a request needs it: who acts, and which sessions are still good. */
export interface ActiveAccount {
  actor: Actor;
  email: string;
  /** A session that was made under another epoch has ended. */
  sessionEpoch: number;
  preferences: Preferences;
}

export interface AccountRow {
  id: number;
  email: string;
  name: string;
  isAdministrator: boolean;
  active: boolean;
  createdAt: string;
}

/** The person with the roles in force at that moment; null when the account does not exist or is closed. */
export async function actorById(userId: number, at: string): Promise<ActiveAccount | null> {
  const user = await User.findByPk(userId);
  if (!user || !user.active) return null;
  const memberships = await Membership.findAll({
    where: { userId, fromAt: { [Op.lte]: at }, untilAt: { [Op.or]: [null, { [Op.gt]: at }] } },
    order: [["id", "ASC"]],
  });
  return {
    actor: {
      userId: user.id,
      printedName: user.name,
      isAdministrator: user.isAdministrator,
      memberships: memberships.map(({ productId, role }) => ({ productId, role })),
    },
    email: user.email,
    sessionEpoch: user.sessionEpoch,
    preferences: parsePreferences(user.preferences),
  };
}

export async function userByEmail(email: string, tx: Transaction | null = null): Promise<AccountRow | null> {
  const user = await User.findOne({ where: { email: normalEmail(email) }, transaction: tx });
  return user ? accountRow(user) : null;
}

export async function userById(userId: number, tx: Transaction | null = null): Promise<AccountRow | null> {
  const user = await User.findByPk(userId, { transaction: tx });
  return user ? accountRow(user) : null;
}

/** All accounts, open and closed, by name. */
export async function listAccounts(): Promise<AccountRow[]> {
  const users = await User.findAll({
    order: [
      ["name", "ASC"],
      ["id", "ASC"],
    ],
  });
  return users.map(accountRow);
}

/** How an address is stored and looked up. */
export function normalEmail(email: string): string {
  return email.trim().toLowerCase();
}

function accountRow({ id, email, name, isAdministrator, active, createdAt }: User): AccountRow {
  return { id, email, name, isAdministrator, active, createdAt };
}

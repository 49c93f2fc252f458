import { QueryTypes, type Transaction } from "sequelize";
import { productByCode, type ProductRow } from "@/lib/budget/load-budget";
import { parseTotals } from "@/lib/budget/stored-results";
import type { PersonName, RegisterEntry } from "@/lib/budget/views";
import { listAccounts, type AccountRow } from "@/lib/users/queries";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Role } from "@/lib/vocabulary/roles";
import { database, inSnapshot } from "@/models/database";
import { authorize, isAllowed } from "@/policies/authorize";
import { warningsFor } from "./establish-product";

/** All products that a person may see, by code: where each stands at its worst point, and what is under way. */
export function registerFor(actor: Actor): Promise<RegisterEntry[]> {
  return inSnapshot(async (tx) => {
    const rows = await database.query<RegisterRow>(REGISTER, { type: QueryTypes.SELECT, transaction: tx });
    return rows
      .filter(({ id }) => isAllowed(actor, { on: "Product", action: "see", productId: id }))
      .map((row) => registerEntry(row, actor));
  });
}

/** One role of one person in a product, ended ones too. */
export interface MembershipView {
  membershipId: number;
  person: PersonName;
  role: Role;
  from: string;
  until: string | null;
}

/** Who holds or held which role in a product, newest first. */
export function membershipsOf(actor: Actor, productCode: string): Promise<MembershipView[]> {
  return inSnapshot(async (tx) => {
    const product = await visibleProduct(actor, productCode, tx);
    const rows = await database.query<MembershipRow>(
      `SELECT m.id AS membershipId, u.id AS userId, u.name, m.role, m.from_at AS fromAt, m.until_at AS untilAt
       FROM memberships m JOIN users u ON u.id = m.user_id
       WHERE m.product_id = :productId ORDER BY m.until_at IS NOT NULL, u.name, m.from_at DESC`,
      { type: QueryTypes.SELECT, replacements: { productId: product.id }, transaction: tx },
    );
    return rows.map(({ membershipId, userId, name, role, fromAt, untilAt }) => ({
      membershipId,
      person: { id: userId, name },
      role,
      from: fromAt,
      until: untilAt,
    }));
  });
}

export interface DeputyView {
  deputyshipId: number;
  holder: PersonName;
  deputy: PersonName;
  fromDay: string;
  untilDay: string;
  endedAt: string | null;
}

/** Who stands in for whom in a product, latest range of days first. */
export function deputiesOf(actor: Actor, productCode: string): Promise<DeputyView[]> {
  return inSnapshot(async (tx) => {
    const product = await visibleProduct(actor, productCode, tx);
    const rows = await database.query<DeputyRow>(
      `SELECT d.id, h.id AS holderId, h.name AS holderName, p.id AS deputyId, p.name AS deputyName,
         d.from_day AS fromDay, d.until_day AS untilDay, d.ended_at AS endedAt
       FROM deputies d JOIN users h ON h.id = d.holder_id JOIN users p ON p.id = d.deputy_id
       WHERE d.product_id = :productId ORDER BY d.from_day DESC, d.id DESC`,
      { type: QueryTypes.SELECT, replacements: { productId: product.id }, transaction: tx },
    );
    return rows.map(({ id, holderId, holderName, deputyId, deputyName, fromDay, untilDay, endedAt }) => ({
      deputyshipId: id,
      holder: { id: holderId, name: holderName },
      deputy: { id: deputyId, name: deputyName },
      fromDay,
      untilDay,
      endedAt,
    }));
  });
}

/** What a program manager is told before and after establishing: a role that is missing. */
export function establishWarnings(actor: Actor, productCode: string, at: string): Promise<string[]> {
  return inSnapshot(async (tx) => warningsFor((await visibleProduct(actor, productCode, tx)).id, at, tx));
}

/** Every account, open and closed, for an administrator. */
export async function accountsFor(actor: Actor): Promise<AccountRow[]> {
  authorize(actor, { on: "Installation", action: "read_accounts" });
  return listAccounts();
}

async function visibleProduct(actor: Actor, productCode: string, tx: Transaction): Promise<ProductRow> {
  const product = await productByCode(productCode, tx);
  authorize(actor, { on: "Product", action: "see", productId: product.id });
  return product;
}

interface MembershipRow {
  membershipId: number;
  userId: number;
  name: string;
  role: Role;
  fromAt: string;
  untilAt: string | null;
}

interface DeputyRow {
  id: number;
  holderId: number;
  holderName: string;
  deputyId: number;
  deputyName: string;
  fromDay: string;
  untilDay: string;
  endedAt: string | null;
}

interface RegisterRow extends ProductRow {
  newestIssue: number | null;
  totals: string | null;
  openProposals: number;
}

const REGISTER = `
  SELECT p.id, p.code, p.name, p.kind, p.time_zone AS timeZone, i.number AS newestIssue, i.totals,
    (SELECT count(*) FROM proposals c WHERE c.product_id = p.id AND c.state IN ('proposed', 'returned')) AS openProposals
  FROM products p LEFT JOIN issues i ON i.product_id = p.id
    AND i.number = (SELECT max(number) FROM issues WHERE product_id = p.id)
  ORDER BY p.code`;

function registerEntry(row: RegisterRow, actor: Actor): RegisterEntry {
  const { id, code, name, kind, timeZone, newestIssue, totals, openProposals } = row;
  const mayRead = isAllowed(actor, { on: "Product", action: "read_budget", productId: id });
  return {
    product: { id, code, name, kind, timeZone, newestIssue },
    roles: actor.memberships.filter(({ productId }) => productId === id).map(({ role }) => role),
    worst: mayRead && totals !== null ? worstOf(totals) : null,
    openProposals: mayRead ? openProposals : 0,
  };
}

function worstOf(text: string): RegisterEntry["worst"] {
  const { worstPoint, points } = parseTotals(text);
  const worst = points.find(({ operatingPoint }) => operatingPoint === worstPoint);
  if (!worst) return null;
  const { operatingPoint, name, totals, limitHundredths, reserveHundredths, standing } = worst;
  const { predicted, margin } = totals;
  const limits = { limit: limitHundredths / 100, reserve: reserveHundredths / 100 };
  return { operatingPoint, name, predicted, ...limits, margin, standing };
}

import { createHash } from "node:crypto";
import { promisify } from "node:util";
import { constants, gunzip, gzip } from "node:zlib";
import { QueryTypes, type Transaction } from "sequelize";
import { canonicalJson } from "@/lib/audit/canonical-json";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database, inSnapshot, inTransaction } from "@/models/database";
import { IssueSheet } from "@/models/issue-sheet";
import { authorize } from "@/policies/authorize";
import { loadBudget } from "./load-budget";
import { loadUncertainty } from "./load-uncertainty";
import { SHEET_RECIPE, type SheetData, sheetsOf, type SheetSource } from "./sheet-data";

export interface SheetQuestion {
  productCode: string;
  issue: number;
  operatingPoint: string;
}

/** The text of a sheet, by its SHA-256; compressed, and left out where the reader has it already. */
export interface KeptSheet {
  sha256: string;
  bytes: Buffer<ArrayBuffer> | null;
}

/**
 * The sheet of an issue at an operating point, as it was kept. What a version before this one wrote is made at its first
 * read and kept from then on.
 *
 * @param known SHA-256 of what the reader has
 */
export async function keptSheet(actor: Actor, question: SheetQuestion, known: string | null): Promise<KeptSheet> {
  const kept = await readKept(question, known);
  if (!kept) throw new Refusal("not_found", "There is no such product.");
  authorize(actor, { on: "Product", action: "read_budget", productId: kept.productId });
  if (kept.sha256 !== null) return { sha256: kept.sha256, bytes: kept.bytes };

  await makeSheets(kept.productId, question.issue);
  const made = await readKept(question, known);
  if (!made || made.sha256 === null) throw new Refusal("not_found", "That issue has no such operating point.");
  return { sha256: made.sha256, bytes: made.bytes };
}

/** The text of a kept sheet. */
export async function sheetText(bytes: Buffer): Promise<string> {
  return (await promisify(gunzip)(bytes)).toString("utf8");
}

/** Keeps the sheets of an issue in the transaction that makes it. */
export async function keepSheets(productId: number, source: SheetSource, tx: Transaction): Promise<void> {
  const rows = [];
  for (const sheet of sheetsOf(source)) rows.push(await storedSheet(productId, sheet));
  await IssueSheet.bulkCreate(rows, { transaction: tx, ignoreDuplicates: true });
}

/** The bytes of a sheet: one text for one content, whoever makes it. */
export function sheetAsText(sheet: SheetData): string {
  return canonicalJson(sheet);
}

async function storedSheet(productId: number, sheet: SheetData) {
  const text = sheetAsText(sheet);
  const { issue, operatingPoint } = sheet;
  const sha256 = createHash("sha256").update(text).digest("hex");
  // Quickly rather than small: it is done while everybody who wants to write waits.
  const bytes = await promisify(gzip)(text, { level: constants.Z_BEST_SPEED });
  return { productId, issue, operatingPoint, recipe: SHEET_RECIPE, sha256, bytes };
}

interface KeptRow {
  productId: number;
  sha256: string | null;
  bytes: Buffer<ArrayBuffer> | null;
}

async function readKept(question: SheetQuestion, known: string | null): Promise<KeptRow | null> {
  const [row] = await database.query<KeptRow>(
    `SELECT p.id AS productId, s.sha256, CASE WHEN s.sha256 = :known THEN NULL ELSE s.bytes END AS bytes
     FROM products p LEFT JOIN issue_sheets s ON s.product_id = p.id AND s.issue = :issue
       AND s.operating_point = :operatingPoint AND s.recipe = ${SHEET_RECIPE}
     WHERE p.code = :productCode`,
    { type: QueryTypes.SELECT, replacements: { ...question, known } },
  );
  return row ?? null;
}

async function makeSheets(productId: number, issue: number): Promise<void> {
  const source = await inSnapshot(async (tx): Promise<SheetSource> => {
    const { state, results } = await loadBudget(productId, issue, tx);
    return { issue, state, results, uncertainty: await loadUncertainty(productId, issue, tx) };
  });
  await inTransaction((tx) => keepSheets(productId, source, tx));
}

import { createHash } from "node:crypto";
import { QueryTypes, type Transaction } from "sequelize";
import { database } from "@/models/database";
import { sheetAsText, sheetText } from "./kept-sheets";
import { loadBudget } from "./load-budget";
import { loadUncertainty } from "./load-uncertainty";
import { SHEET_RECIPE, sheetsOf } from "./sheet-data";

/** Operating points of an issue whose kept sheet says something else than what the issue keeps. */
export async function differingSheets(productId: number, issue: number, tx: Transaction): Promise<string[]> {
  const kept = await database.query<{ operatingPoint: string; sha256: string; bytes: Buffer }>(
    `SELECT operating_point AS operatingPoint, sha256, bytes FROM issue_sheets
     WHERE product_id = :productId AND issue = :issue AND recipe = ${SHEET_RECIPE} ORDER BY operating_point`,
    { type: QueryTypes.SELECT, replacements: { productId, issue }, transaction: tx },
  );
  if (kept.length === 0) return [];

  const { state, results } = await loadBudget(productId, issue, tx);
  const uncertainty = await loadUncertainty(productId, issue, tx);
  const sheets = sheetsOf({ issue, state, results, uncertainty });
  const texts = new Map(sheets.map((sheet) => [sheet.operatingPoint, sheetAsText(sheet)]));
  const differing: string[] = [];
  for (const { operatingPoint, sha256, bytes } of kept) {
    const text = await sheetText(bytes).catch(() => null);
    const isKept = text !== null && text === texts.get(operatingPoint) && sha256 === hashOf(text);
    if (!isKept) differing.push(operatingPoint);
  }
  return differing;
}

function hashOf(text: string): string {
  return createHash("sha256").update(text).digest("hex");
}

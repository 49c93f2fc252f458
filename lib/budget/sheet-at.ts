import { QueryTypes, type Transaction } from "sequelize";
import { z } from "zod";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { database, inSnapshot } from "@/models/database";
import { issueFactsOf } from "./issue-facts";
import { keptSheet, sheetText } from "./kept-sheets";
import { namesOf } from "./members";
import { type AsOf, issueNumber, readableProduct } from "./queries";
import type { SheetData } from "./sheet-data";
import type { IssueFacts, PersonName, ProductFacts } from "./views";

/** The sheet of a budget with what is told around it. */
export interface SheetAt {
  product: ProductFacts;
  issue: IssueFacts;
  people: PersonName[];
  sheet: SheetData;
}

/** The budget sheet at one operating point, else at the one that stands worst: read as it was kept, nothing computed. */
export async function sheetAt(actor: Actor, productCode: string, asOf: AsOf, asked?: string): Promise<SheetAt> {
  const { worstPoint, ...facts } = await inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const number = await issueNumber(product, asOf, tx);
    const issues = await issueFactsOf(product, tx);
    const issue = issues.find((each) => each.number === number);
    if (!issue) throw new Refusal("not_found", `There is no issue ${number} of this budget.`);
    return {
      product: { ...product, newestIssue: issues.at(-1)?.number ?? null },
      issue,
      people: await namesOf(product.id, tx),
      worstPoint: await worstPointOf(product.id, number, tx),
    };
  });
  const question = { productCode, issue: facts.issue.number, operatingPoint: asked ?? worstPoint };
  const { bytes } = await keptSheet(actor, question, null);
  if (bytes === null) throw new Error("A sheet that nobody has was not sent.");
  return { ...facts, sheet: StoredSheet.parse(JSON.parse(await sheetText(bytes))) };
}

/** Written by ourselves and named by its recipe: the shape is looked at, not every row. */
const StoredSheet = z.custom<SheetData>((value) => z.object({ rows: z.array(z.unknown()) }).safeParse(value).success);

async function worstPointOf(productId: number, issue: number, tx: Transaction): Promise<string> {
  const [row] = await database.query<{ worstPoint: string }>(
    "SELECT totals ->> '$.worstPoint' AS worstPoint FROM issues WHERE product_id = :productId AND number = :issue",
    { type: QueryTypes.SELECT, replacements: { productId, issue }, transaction: tx },
  );
  if (!row) throw new Refusal("not_found", `There is no issue ${issue} of this budget.`);
  return row.worstPoint;
}

import { QueryTypes } from "sequelize";
import { database } from "@/models/database";

/** The invariants are recounted from the rows: nothing of the product's reading code is used for it. */
export function rows<Row extends object>(sql: string, replacements: Record<string, string | number> = {}) {
  return database.query<Row>(sql, { type: QueryTypes.SELECT, replacements });
}

export interface ProductKey {
  id: number;
  code: string;
}

export function allProducts(): Promise<ProductKey[]> {
  return rows<ProductKey>("SELECT id, code FROM products ORDER BY code");
}

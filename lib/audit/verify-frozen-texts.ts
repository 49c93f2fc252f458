import { QueryTypes, type Transaction } from "sequelize";
import { database } from "@/models/database";
import type { Product } from "@/models/product";
import { chainFault, type ChainFault } from "./chain-report";
import { type HashedKind, textHash } from "./text-hash";

interface FrozenText {
  id: number;
  text: string;
  hash: string;
}

const ROUNDS = `SELECT r.id, r.canonical_text AS text, r.hash FROM rounds r
  JOIN proposals p ON p.id = r.proposal_id WHERE p.product_id = :productId`;
const SIGNATURES = "SELECT id, canonical_text AS text, hash FROM signatures WHERE product_id = :productId";

const RUNS = "SELECT id, result AS text, result_hash AS hash FROM monte_carlo_runs WHERE product_id = :productId";

/** The texts under which rounds were submitted and signatures given, and what came out of runs, still give their hashes. */
export async function verifyFrozenTexts(product: Product, tx: Transaction): Promise<ChainFault[]> {
  const query = { type: QueryTypes.SELECT, transaction: tx, replacements: { productId: product.id } } as const;
  const rounds = await database.query<FrozenText>(ROUNDS, query);
  const signatures = await database.query<FrozenText>(SIGNATURES, query);
  const runs = await database.query<FrozenText>(RUNS, query);
  return [...faultsOf("round", rounds), ...faultsOf("signature", signatures), ...faultsOf("monte-carlo-result", runs)];
}

function faultsOf(kind: HashedKind, texts: readonly FrozenText[]): ChainFault[] {
  return texts
    .filter(({ text, hash }) => textHash(kind, text) !== hash)
    .map(({ id }) => chainFault("text", `${kind} ${id}`));
}

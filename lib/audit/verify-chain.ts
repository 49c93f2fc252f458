import { QueryTypes, type Transaction } from "sequelize";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import { database, inSnapshot } from "@/models/database";
import { ChainHead } from "@/models/chain-head";
import { Product } from "@/models/product";
import { chainFault, type ChainFault, type ChainReport } from "./chain-report";
import { verifyBindings } from "./verify-bindings";
import { readChain, type ReadChain } from "./verify-entries";
import { verifyFrozenTexts } from "./verify-frozen-texts";
import { verifyIssues } from "./verify-issues";
import type { ChainHeadValue } from "./write-entry";

export interface VerifyOptions {
  /** A head that was written down outside the installation: a chain cannot see its own end being cut. */
  knownHead?: ChainHeadValue;
}

/**
 * Proves that a chain is unbroken, from what is stored: every entry, where the chain ends, the rows that entries
 * bind, and the hashes of what issues, rounds and signatures froze. An empty list of faults is the proof.
 */
export function verifyChain(chain: string, { knownHead }: VerifyOptions = {}): Promise<ChainReport> {
  return inSnapshot(async (tx) => {
    const read = await readChain(chain, tx);
    const faults = [...read.faults, ...(await verifyHead(chain, read, tx)), ...(await verifyNothingCut(tx))];
    if (knownHead && knownHead.sequence > 0 && read.hashes.get(knownHead.sequence) !== knownHead.hash) {
      faults.push(chainFault("known_head", `entry ${knownHead.sequence}`));
    }
    const product = chain === HOUSE_CHAIN ? null : await Product.findOne({ where: { code: chain }, transaction: tx });
    const bindings = product ? await verifyBindings(product.id, read.records, tx) : { count: 0, faults: [] };
    faults.push(...bindings.faults);
    if (product) {
      faults.push(...(await verifyIssues(product, read.hashes, tx)), ...(await verifyFrozenTexts(product, tx)));
    }
    return { chain, entries: read.count, records: bindings.count, head: read.head, faults };
  });
}

async function verifyHead(chain: string, { head }: ReadChain, tx: Transaction): Promise<ChainFault[]> {
  const kept = await ChainHead.findByPk(chain, { transaction: tx });
  const agrees = kept ? kept.sequence === head.sequence && kept.hash === head.hash : head.sequence === 0;
  return agrees ? [] : [chainFault("head", `entry ${kept?.sequence ?? head.sequence}`)];
}

/** Row ids are given without a gap and never again; SQLite keeps the newest that it ever gave. */
async function verifyNothingCut(tx: Transaction): Promise<ChainFault[]> {
  const [row] = await database.query<{ entries: number; given: number }>(
    `SELECT (SELECT count(*) FROM history_entries) AS entries,
      coalesce((SELECT seq FROM sqlite_sequence WHERE name = 'history_entries'), 0) AS given`,
    { type: QueryTypes.SELECT, transaction: tx },
  );
  if (!row || row.entries === row.given) return [];
  return [chainFault("cut", "history", `${row.given} were written in all chains together, ${row.entries} are there.`)];
}

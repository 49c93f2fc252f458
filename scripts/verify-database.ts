// Recomputes every issue with the versions that its lines name, checks every chain, and reads every file of evidence.
// Exit 1 where anything differs.
import { existsSync } from "node:fs";
import { QueryTypes } from "sequelize";
import { verifyChain } from "@/lib/audit/verify-chain";
import { differingSheets } from "@/lib/budget/differing-sheets";
import { recomputeIssue } from "@/lib/budget/recompute-issue";
import type { RecomputedDifference } from "@/lib/budget/recomputed-difference";
import { verifyFiles } from "@/lib/evidence/verify-files";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import { closeDatabase, database, databaseFile, inSnapshot, openDatabase } from "@/models/database";

void verifyDatabase().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 2;
});

interface StoredIssue {
  productId: number;
  code: string;
  number: number;
}

async function verifyDatabase(): Promise<void> {
  if (!existsSync(databaseFile()))
    throw new Error(`There is no database ${databaseFile()}; LEEBOARD_DATA names its folder.`);
  await openDatabase();
  try {
    const issues = await storedIssues();
    let faults = await faultsOfChains([HOUSE_CHAIN, ...new Set(issues.map(({ code }) => code))]);
    for (const issue of issues) faults += await faultsOfIssue(issue);
    faults += await faultsOfFiles();
    console.log(faults === 0 ? "\nEverything agrees." : `\n${faults} ${faults === 1 ? "fault" : "faults"}.`);
    process.exitCode = faults === 0 ? 0 : 1;
  } finally {
    await closeDatabase();
  }
}

function storedIssues(): Promise<StoredIssue[]> {
  return inSnapshot((tx) =>
    database.query<StoredIssue>(
      `SELECT p.id AS productId, p.code, i.number FROM issues i JOIN products p ON p.id = i.product_id
       ORDER BY p.code, i.number`,
      { type: QueryTypes.SELECT, transaction: tx },
    ),
  );
}

async function faultsOfChains(chains: readonly string[]): Promise<number> {
  let count = 0;
  for (const chain of chains) {
    const { entries, records, faults } = await verifyChain(chain);
    console.log(`history ${chain}: ${entries} entries, ${records} bound rows, ${faults.length} faults`);
    for (const { where, sentence } of faults) console.log(`  ${where}: ${sentence}`);
    count += faults.length;
  }
  return count;
}

async function faultsOfIssue({ productId, code, number }: StoredIssue): Promise<number> {
  const differences = await inSnapshot((tx) => recomputeIssue(productId, number, tx));
  const sheets = await inSnapshot((tx) => differingSheets(productId, number, tx));
  console.log(`${code} issue ${number}: ${differences.length === 0 ? "computes to what it keeps" : "differs"}`);
  for (const difference of differences) console.log(`  ${differenceText(difference)}`);
  for (const operatingPoint of sheets) console.log(`  ${operatingPoint}: the sheet that was kept says something else`);
  return differences.length + sheets.length;
}

async function faultsOfFiles(): Promise<number> {
  const { files, faults } = await inSnapshot(verifyFiles);
  console.log(`files: ${files} of evidence, ${faults.length} ${faults.length === 1 ? "fault" : "faults"}`);
  for (const { file, sentence } of faults) console.log(`  ${file}: ${sentence}`);
  return faults.length;
}

function differenceText({ operatingPoint, item, quantity, stored, recomputed }: RecomputedDifference): string {
  const subject = item === "" ? "total" : `item ${item}`;
  return `${operatingPoint}, ${subject}, ${quantity}: keeps ${stored}, today's code gives ${recomputed}`;
}

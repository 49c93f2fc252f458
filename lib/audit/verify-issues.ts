import { QueryTypes, type Transaction } from "sequelize";
import type { LineKind } from "@/lib/vocabulary/lines";
import { database } from "@/models/database";
import { Issue } from "@/models/issue";
import type { Product } from "@/models/product";
import { chainFault, type ChainFault } from "./chain-report";
import { GENESIS_HASH } from "./entry-hash";
import { issueContentHash, type IssueContent } from "./issue-content-hash";
import { lineRevisionHash } from "./line-revision-hash";

interface RevisionRow {
  kind: LineKind;
  number: string;
  letter: string;
  issue: number;
  retired: number;
  body: string;
  hash: string;
}

type ResultRow = IssueContent["results"][number] & { issue: number };

const REVISIONS = `SELECT l.kind, l.number, r.letter, r.issue, r.retired, r.body, r.hash
  FROM line_revisions r JOIN lines l ON l.id = r.line_id WHERE r.product_id = :productId ORDER BY r.id`;

const RESULTS = `SELECT i.number AS item, p.number AS operatingPoint, r.issue, r.method_version AS methodVersion, r.basic,
    r.growth_fraction AS growthFraction, r.growth, r.predicted, r.notes, r.answer
  FROM results r JOIN lines i ON i.id = r.item_id JOIN lines p ON p.id = r.operating_point_id
  WHERE r.product_id = :productId ORDER BY r.id`;

/** Every issue's content gives its hash, every revision its own, and the head that an issue names stands in the chain. */
export async function verifyIssues(
  product: Product,
  hashes: ReadonlyMap<number, string>,
  tx: Transaction,
): Promise<ChainFault[]> {
  const query = { type: QueryTypes.SELECT, transaction: tx, replacements: { productId: product.id } } as const;
  const issues = await Issue.findAll({ where: { productId: product.id }, order: [["number", "ASC"]], transaction: tx });
  const revisions = await database.query<RevisionRow>(REVISIONS, query);
  const results = await database.query<ResultRow>(RESULTS, query);
  return [
    ...revisions.flatMap((revision) => revisionFaults(product.code, revision)),
    ...issues.flatMap((issue, index) => [
      ...(issue.number === index + 1 ? [] : [chainFault("gap", `issue ${issue.number}`)]),
      ...contentFaults(product.code, issue, revisions, results),
      ...headFaults(issue, hashes),
    ]),
  ];
}

function revisionFaults(productCode: string, revision: RevisionRow): ChainFault[] {
  const hash = lineRevisionHash({ ...revision, productCode, retired: revision.retired === 1 });
  const { kind, number, letter } = revision;
  return hash === revision.hash ? [] : [chainFault("text", `${kind} ${number}, revision ${letter}`)];
}

function contentFaults(
  productCode: string,
  issue: Issue,
  revisions: readonly RevisionRow[],
  results: readonly ResultRow[],
): ChainFault[] {
  const hash = issueContentHash({
    productCode,
    number: issue.number,
    totals: issue.totals,
    uncertainty: issue.uncertainty,
    revisions: revisions.filter((row) => row.issue === issue.number),
    results: results.filter((row) => row.issue === issue.number),
  });
  return hash === issue.contentHash ? [] : [chainFault("content", `issue ${issue.number}`)];
}

function headFaults({ number, chainSequence, chainHash }: Issue, hashes: ReadonlyMap<number, string>): ChainFault[] {
  const standing = chainSequence === 0 ? GENESIS_HASH : hashes.get(chainSequence);
  return standing === chainHash ? [] : [chainFault("issue_head", `issue ${number}`)];
}

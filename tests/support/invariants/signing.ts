import { rows } from "./rows";

interface SignedRound {
  signature: number;
  proposal: number;
  signer: number;
  deputyFor: number | null;
  proposer: number;
  round: number;
}

/** 3: a signature's signer has no part in the proposal, as themselves or as deputy; nor owns what it edits. */
export async function independenceFaults(): Promise<string[]> {
  const signed = await rows<SignedRound>(
    `SELECT s.id AS signature, c.id AS proposal, s.signer_id AS signer, s.deputy_for_id AS deputyFor,
       c.proposer_id AS proposer, r.id AS round
     FROM signatures s JOIN rounds r ON r.id = s.round_id JOIN proposals c ON c.id = r.proposal_id`,
  );
  const faults: string[] = [];
  for (const { signature, proposal, signer, deputyFor, proposer, round } of signed) {
    const editors = await rows<{ id: number }>(
      "SELECT user_id AS id FROM proposal_editors WHERE proposal_id = :proposal",
      { proposal },
    );
    const owners = await ownersOf(round);
    const barred = new Set([proposer, ...editors.map(({ id }) => id), ...owners]);
    if (barred.has(signer))
      faults.push(`3: signature ${signature} is by a person with a part in proposal ${proposal}.`);
    if (deputyFor !== null && barred.has(deputyFor)) faults.push(`3: signature ${signature} is for a barred person.`);
  }
  return faults;
}

/** Owners of the edited items in the round's bodies and in the base revisions. */
async function ownersOf(round: number): Promise<number[]> {
  const owners = await rows<{ owner: number | null }>(
    `SELECT json_extract(e.body, '$.ownerId') AS owner FROM round_edits e JOIN lines l ON l.id = e.line_id
       WHERE e.round_id = :round AND l.kind = 'item'
     UNION SELECT json_extract(v.body, '$.ownerId') FROM round_edits e
       JOIN line_revisions v ON v.line_id = e.line_id AND v.letter = e.base_letter
       JOIN lines l ON l.id = e.line_id WHERE e.round_id = :round AND l.kind = 'item'`,
    { round },
  );
  return owners.flatMap(({ owner }) => (owner === null ? [] : [owner]));
}

interface ApprovedRound {
  proposal: number;
  round: number;
  endedAt: string;
  reviewers: number | null;
  submittedAs: string | null;
  issue: number;
  product: number;
}

/** 7: an approved proposal had no unsettled request, and all signatures that its rules asked for on its last round. */
export async function approvalFaults(): Promise<string[]> {
  const approved = await rows<ApprovedRound>(
    `SELECT c.id AS proposal, r.id AS round, c.ended_at AS endedAt, r.submitted_as AS submittedAs,
       json_extract(r.rules, '$.reviewers') AS reviewers, i.number AS issue, c.product_id AS product
     FROM proposals c JOIN rounds r ON r.proposal_id = c.id AND r.number = c.round
       JOIN issues i ON i.proposal_id = c.id
     WHERE c.state = 'approved'`,
  );
  const faults: string[] = [];
  for (const each of approved) faults.push(...(await faultsOfApproval(each)));
  return faults;
}

async function faultsOfApproval(approved: ApprovedRound): Promise<string[]> {
  const { proposal, round, endedAt, reviewers, submittedAs } = approved;
  const unsettled = await rows(
    `SELECT id FROM comments WHERE proposal_id = :proposal AND asks_action = 1
       AND written_at <= :endedAt AND (settled_at IS NULL OR settled_at > :endedAt)`,
    { proposal, endedAt },
  );
  const approvals = await rows<{ signer: number; capacity: string }>(
    `SELECT signer_id AS signer, capacity FROM signatures s WHERE round_id = :round AND decision = 'approve'
       AND NOT EXISTS (SELECT 1 FROM signatures t WHERE t.takes_back_id = s.id)`,
    { round },
  );
  const by = (capacity: string) => approvals.filter((approval) => approval.capacity === capacity);
  const asksManager = await managerIsAsked(approved);
  const managerSigned = by("program_manager").length > 0 || submittedAs === "program_manager";
  return [
    ...(unsettled.length === 0 ? [] : [`7: proposal ${proposal} was approved with an unsettled request.`]),
    ...(by("reviewer").length >= Math.max(1, reviewers ?? 1) ? [] : [`7: proposal ${proposal} lacks a reviewer.`]),
    ...(new Set(approvals.map(({ signer }) => signer)).size === approvals.length
      ? []
      : [`7: somebody signed proposal ${proposal} in two capacities.`]),
    ...(asksManager === null || managerSigned
      ? []
      : [`7: proposal ${proposal} lacks a program manager: ${asksManager}.`]),
  ];
}

interface PointTotals {
  operatingPoint: string;
  limitHundredths: number;
  standing: string;
  totals: { predicted: number };
}

const STANDINGS = ["inside", "into_the_reserve", "over"];

/** The rules that the rows alone can tell: what was edited, and what the totals did at each operating point. */
async function managerIsAsked({ round, issue, product }: ApprovedRound): Promise<string | null> {
  const [edits] = await rows<{ touched: number; transfers: number; rules: string }>(
    `SELECT (SELECT count(*) FROM round_edits e JOIN lines l ON l.id = e.line_id WHERE e.round_id = r.id
         AND (l.kind IN ('terms', 'finish', 'allocations') OR (l.kind = 'item' AND e.operation <> 'revise'))) AS touched,
       (SELECT count(*) FROM round_transfers WHERE round_id = r.id) AS transfers, r.rules
     FROM rounds r WHERE r.id = :round`,
    { round },
  );
  const totals = await rows<{ totals: string }>(
    "SELECT totals FROM issues WHERE product_id = :product AND number IN (:issue - 1, :issue) ORDER BY number",
    { product, issue },
  );
  if (edits?.touched) return "it touches what only a program manager may release";
  if (edits?.transfers) return "it transfers";
  const asks = JSON.parse(edits?.rules ?? "{}").programManagerOn ?? {};
  const [before, after] = totals.map((row): PointTotals[] => JSON.parse(row.totals).points);
  for (const point of after ?? []) {
    const was = before?.find(({ operatingPoint }) => operatingPoint === point.operatingPoint);
    if (!was) return "it adds an operating point";
    const rise = Math.round((point.totals.predicted - was.totals.predicted) * 100);
    if (asks.predictedRisePercent && rise > 0 && rise * 100 >= asks.predictedRisePercent * point.limitHundredths) {
      return `predicted rises by ${rise / 100} N`;
    }
    if (STANDINGS.indexOf(point.standing) > STANDINGS.indexOf(was.standing)) return "the standing falls";
  }
  return null;
}

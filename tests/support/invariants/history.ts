import { rows } from "./rows";

/** Tables whose every row is the work of one act. */
const TABLES: Record<string, string> = {
  issue: "issues",
  round: "rounds",
  signature: "signatures",
  objection: "objections",
  comment: "comments",
  baseline: "baselines",
  attachment: "attachments",
  membership: "memberships",
};

/** 9: each act is in the history exactly once, each refused act too; every outbox message belongs to an act. */
export async function historyFaults(): Promise<string[]> {
  const entries = await rows<{ id: number; outcome: string; text: string }>(
    "SELECT id, outcome, canonical_text AS text FROM history_entries",
  );
  const named = new Map<string, number>();
  for (const { text } of entries) {
    const { records }: { records: { type: string; id: number }[] } = JSON.parse(text);
    for (const { type, id } of records) named.set(`${type} ${id}`, (named.get(`${type} ${id}`) ?? 0) + 1);
  }
  const faults: string[] = [];
  for (const [type, table] of Object.entries(TABLES)) {
    for (const { id } of await rows<{ id: number }>(`SELECT id FROM ${table}`)) {
      const times = named.get(`${type} ${id}`) ?? 0;
      if (times !== 1) faults.push(`9: ${type} ${id} stands ${times} times in the history.`);
    }
  }
  return [...faults, ...refusalFaults(entries), ...(await endFaults()), ...(await outboxFaults())];
}

/** A refused act wrote nothing but its entry. */
function refusalFaults(entries: readonly { id: number; outcome: string; text: string }[]): string[] {
  return entries
    .filter(({ outcome, text }) => outcome === "refused" && JSON.parse(text).records.length > 0)
    .map(({ id }) => `9: the refused act of entry ${id} wrote rows.`);
}

/** Each proposal that ended did so by one act. */
async function endFaults(): Promise<string[]> {
  const ends = await rows<{ state: string; proposals: number; acts: number }>(
    `SELECT e.state, (SELECT count(*) FROM proposals WHERE state = e.state) AS proposals,
       (SELECT count(*) FROM history_entries WHERE act = e.act AND outcome = 'done') AS acts
     FROM (SELECT 'withdrawn' AS state, 'withdraw_proposal' AS act
       UNION ALL SELECT 'disapproved', 'disapprove_proposal') e`,
  );
  return ends
    .filter(({ proposals, acts }) => proposals !== acts)
    .map(({ state, proposals, acts }) => `9: ${proposals} proposals are ${state}, by ${acts} acts.`);
}

async function outboxFaults(): Promise<string[]> {
  const lost = await rows<{ id: number }>(
    `SELECT m.id FROM outbox_messages m LEFT JOIN history_entries e ON e.id = m.entry_id
     WHERE e.id IS NULL OR e.outcome <> 'done'`,
  );
  return lost.map(({ id }) => `9: message ${id} belongs to no act.`);
}

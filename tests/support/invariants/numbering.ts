import { rows } from "./rows";

/** 1: issue numbers are 1, 2, 3 … without a gap; each but the first has one approved proposal, and the reverse. */
export async function issueNumberFaults(): Promise<string[]> {
  const issues = await rows<{
    code: string;
    number: number;
    proposal: number | null;
    state: string | null;
    place: number;
  }>(
    `SELECT p.code, i.number, i.proposal_id AS proposal, c.state,
       row_number() OVER (PARTITION BY i.product_id ORDER BY i.number) AS place
     FROM issues i JOIN products p ON p.id = i.product_id LEFT JOIN proposals c ON c.id = i.proposal_id`,
  );
  const lonely = await rows<{ id: number; made: number }>(
    `SELECT c.id, (SELECT count(*) FROM issues WHERE proposal_id = c.id) AS made
     FROM proposals c WHERE c.state = 'approved' AND made <> 1`,
  );
  return [
    ...issues
      .filter(({ number, place }) => number !== place)
      .map(({ code, number, place }) => `1: ${code} has issue ${number} in place ${place}.`),
    ...issues
      .filter(({ number, proposal, state }) => (number === 1 ? proposal !== null : state !== "approved"))
      .map(({ code, number, state }) => `1: ${code} issue ${number} has a proposal in state ${state}.`),
    ...lonely.map(({ id, made }) => `1: the approved proposal ${id} made ${made} issues.`),
  ];
}

/** 2: at most one revision of a line per issue; letters follow ASME Y14.35 without a gap. */
export async function revisionLetterFaults(): Promise<string[]> {
  const revisions = await rows<{ line: string; letter: string; issue: number; place: number }>(
    `SELECT p.code || ' ' || l.kind || ' ' || l.number AS line, r.letter, r.issue,
       row_number() OVER (PARTITION BY r.line_id ORDER BY r.issue) - 1 AS place
     FROM line_revisions r JOIN lines l ON l.id = r.line_id JOIN products p ON p.id = l.product_id`,
  );
  const letters = revisionLetters(revisions.length);
  const seen = new Set<string>();
  return revisions.flatMap(({ line, letter, issue, place }) => {
    const twice = seen.has(`${line} ${issue}`) ? [`2: ${line} has two revisions at issue ${issue}.`] : [];
    seen.add(`${line} ${issue}`);
    return letter === letters[place] ? twice : [...twice, `2: ${line} has ${letter} where ${letters[place]} is due.`];
  });
}

/** 4: a history entry's previous hash is the hash of the entry before it in its chain. */
export async function chainLinkFaults(): Promise<string[]> {
  const entries = await rows<{
    chain: string;
    sequence: number;
    previous: string;
    before: string | null;
    place: number;
  }>(
    `SELECT chain, sequence, previous_hash AS previous,
       lag(hash) OVER (PARTITION BY chain ORDER BY sequence) AS before,
       row_number() OVER (PARTITION BY chain ORDER BY sequence) AS place
     FROM history_entries`,
  );
  return entries
    .filter(({ previous, before, sequence, place }) => previous !== (before ?? "0".repeat(64)) || sequence !== place)
    .map(({ chain, sequence }) => `4: entry ${sequence} of ${chain} does not follow the one before it.`);
}

/** 5: a proposal in an end state never changes again: nothing that belongs to it is younger than its end. */
export async function endStateFaults(): Promise<string[]> {
  const late = await rows<{ id: number; what: string }>(
    `SELECT c.id, 'round' AS what FROM proposals c JOIN rounds r ON r.proposal_id = c.id
       WHERE r.submitted_at > c.ended_at
     UNION ALL SELECT c.id, 'signature' FROM proposals c JOIN rounds r ON r.proposal_id = c.id
       JOIN signatures s ON s.round_id = r.id WHERE s.signed_at > c.ended_at
     UNION ALL SELECT c.id, 'edit' FROM proposals c JOIN proposal_editors e ON e.proposal_id = c.id
       WHERE e.last_edit_at > c.ended_at`,
  );
  const guards = await rows<{ name: string }>(
    "SELECT name FROM sqlite_master WHERE type = 'trigger' AND name = 'proposals_end_is_end'",
  );
  return [
    ...late.map(({ id, what }) => `5: proposal ${id} has a ${what} that is younger than its end.`),
    ...(guards.length === 1 ? [] : ["5: nothing keeps a proposal in its end state."]),
  ];
}

/** ASME Y14.35: "–", then the alphabet without I, O, Q, S, X, Z in one letter, in two, … as many as are asked for. */
export function revisionLetters(count: number): string[] {
  const alphabet = [..."ABCDEFGHIJKLMNOPQRSTUVWXYZ"].filter((letter) => !"IOQSXZ".includes(letter));
  const letters = ["–"];
  for (let ahead = [""]; letters.length <= count; ahead = ahead.flatMap((each) => alphabet.map((a) => each + a))) {
    letters.push(...ahead.flatMap((each) => alphabet.map((letter) => each + letter)));
  }
  return letters;
}

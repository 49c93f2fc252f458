import { QueryTypes, type Transaction } from "sequelize";
import { z } from "zod";
import { EvidenceCitation } from "@/lib/evaluation/lines/items/item-common";
import { database } from "@/models/database";
import type { DraftEdit } from "../schema";

/** A file that a submitted round cites. */
export interface RoundCitation {
  roundId: number;
  proposalId: number;
  round: number;
  isCurrent: boolean;
  sha256: string;
}

/** Every file that any submitted round of a product cites; bodies without one are passed over unread. */
export function citedInRounds(productId: number, tx: Transaction): Promise<RoundCitation[]> {
  return database.query<RoundCitation>(
    `SELECT DISTINCT r.id AS roundId, p.id AS proposalId, r.number AS round,
       p.state = 'proposed' AND p.round = r.number AS isCurrent,
       json_extract(c.value, '$.file.sha256') AS sha256
     FROM proposals p JOIN rounds r ON r.proposal_id = p.id JOIN round_edits e ON e.round_id = r.id,
       json_each(CASE WHEN instr(e.body, '"sha256"') > 0 THEN e.body ELSE '{}' END, '$.evidence') c
     WHERE p.product_id = :productId AND json_extract(c.value, '$.file.sha256') IS NOT NULL
     ORDER BY r.id`,
    { type: QueryTypes.SELECT, replacements: { productId }, transaction: tx },
  );
}

export interface LineCitation {
  /** Place of the edit and of the citation within it. */
  edit: number;
  entry: number;
  kind: DraftEdit["kind"];
  number: string;
  citation: EvidenceCitation;
}

/** Citations of the edited lines that are complete. */
export function citationsIn(edits: readonly DraftEdit[]): LineCitation[] {
  return edits.flatMap(({ kind, number, body }, edit) =>
    citationsOf(body).map(({ entry, citation }) => ({ edit, entry, kind, number, citation })),
  );
}

export function citationsOf(body: unknown): { entry: number; citation: EvidenceCitation }[] {
  const { evidence } = WithEvidence.safeParse(body).data ?? { evidence: [] };
  return evidence.flatMap((each, entry) => {
    const citation = EvidenceCitation.safeParse(each);
    return citation.success ? [{ entry, citation: citation.data }] : [];
  });
}

const WithEvidence = z.object({ evidence: z.array(z.unknown()) });

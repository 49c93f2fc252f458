import { QueryTypes, type Transaction } from "sequelize";
import { database } from "@/models/database";
import { placeOf } from "./file-places";
import { hashOf } from "./keep-file";

export interface FileFault {
  file: string;
  sentence: string;
}

export interface FilesReport {
  files: number;
  faults: FileFault[];
}

interface HeldContent {
  sha256: string;
  names: string;
}

/** Reads every file of evidence whole and compares it with the hash under which its rows keep it. */
export async function verifyFiles(tx: Transaction): Promise<FilesReport> {
  const held = await database.query<HeldContent>(
    `SELECT sha256, group_concat(DISTINCT name) AS names FROM attachments GROUP BY sha256 ORDER BY min(id)`,
    { type: QueryTypes.SELECT, transaction: tx },
  );
  const faults: FileFault[] = [];
  for (const { sha256, names } of held) {
    const sentence = await faultOf(sha256);
    if (sentence) faults.push({ file: `${names} (${sha256.slice(0, 12)})`, sentence });
  }
  return { files: held.length, faults };
}

async function faultOf(sha256: string): Promise<string | null> {
  try {
    const found = await hashOf(placeOf(sha256));
    return found === sha256 ? null : `Its content gives ${found.slice(0, 12)}: it is not the file that was added.`;
  } catch (problem) {
    if (problem instanceof Error && "code" in problem && problem.code === "ENOENT") {
      return "It is not where it was kept.";
    }
    throw problem;
  }
}

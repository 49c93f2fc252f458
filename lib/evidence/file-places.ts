import path from "node:path";
import { dataFolder } from "@/models/database";

/** Where files are kept, beside the database: by the hash of their content, so that the same content stands once. */
export function filesFolder(): string {
  return path.join(dataFolder(), "files");
}

export function placeOf(sha256: string): string {
  return path.join(filesFolder(), sha256.slice(0, 2), sha256);
}

/** Where a file grows while it arrives. */
export function incomingFolder(): string {
  return path.join(filesFolder(), "incoming");
}

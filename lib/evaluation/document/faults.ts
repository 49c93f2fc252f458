import type { z } from "zod";

/** A fault of a document at its own path. */
export interface DocumentFault {
  /** As a reader writes it: `items[0].length`; empty for the document itself. */
  path: string;
  message: string;
}

/** Every fault of a parse, one entry each; an unknown field is told at that field. */
export function faultsOf(error: z.ZodError): DocumentFault[] {
  return error.issues.flatMap((issue) =>
    issue.code === "unrecognized_keys"
      ? issue.keys.map((key) => ({ path: writtenPath([...issue.path, key]), message: "is not a field here" }))
      : [{ path: writtenPath(issue.path), message: issue.message }],
  );
}

/** `items[0].length: must be greater than 0` */
export function faultLine({ path, message }: DocumentFault): string {
  return `${path === "" ? "document" : path}: ${message}`;
}

function writtenPath(path: readonly PropertyKey[]): string {
  return path.reduce<string>((written, part) => {
    if (typeof part === "number") return `${written}[${part}]`;
    return written === "" ? String(part) : `${written}.${String(part)}`;
  }, "");
}

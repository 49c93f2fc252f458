import type { Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { isAllowed } from "@/policies/authorize";
import { fileOfContent, readableFiles, type FileRecord } from "../records/file-records";
import type { FileView } from "../views";

export function fileView(actor: Actor, file: FileRecord): FileView {
  const { id: fileId, name, mediaType, size, sha256, sourceDate, addedBy, addedAt, addedById, productId } = file;
  const { voidedBy, voidedAt, voidReason } = file;
  return {
    ...{ fileId, name, mediaType, size, sha256, sourceDate, addedBy, addedAt },
    voided: voidedAt === null ? null : { by: voidedBy ?? "", at: voidedAt, reason: voidReason ?? "" },
    mayVoid: voidedAt === null && isAllowed(actor, { on: "File", action: "void", productId, addedById }),
  };
}

/** What a citation can name, each content once, newest first; voided ones too, since a citation may name one. */
export async function heldFiles(actor: Actor, productId: number, tx: Transaction): Promise<FileView[]> {
  const files = await readableFiles(actor, productId, tx);
  const contents = [...new Set(files.map(({ sha256 }) => sha256))].reverse();
  return contents.flatMap((sha256) => {
    const file = fileOfContent(files, sha256);
    return file ? [fileView(actor, file)] : [];
  });
}

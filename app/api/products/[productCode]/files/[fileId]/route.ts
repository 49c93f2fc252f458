import { createReadStream } from "node:fs";
import { stat } from "node:fs/promises";

import { isForeignRead } from "@/app/_server/request-limits";
import { refusalResponse, signedOut } from "@/app/_server/route-problem";
import { DOWNLOAD_POLICY } from "@/app/_server/security-headers";
import { currentActor } from "@/app/_server/session";
import { downloadName } from "@/lib/evidence/download-name";
import { fileToOpen, noteOpening, type OpenedFile } from "@/lib/proposals/files/open-file";
import { Refusal } from "@/lib/vocabulary/refusal";

type Context = RouteContext<"/api/products/[productCode]/files/[fileId]">;

/** A file as it came, to be saved and never shown in place. Sent whole, it counts as opened by who asked for it. */
export async function GET(request: Request, { params }: Context): Promise<Response> {
  const actor = await currentActor();
  if (!actor) return signedOut();

  const { productCode, fileId } = await params;
  try {
    if (!/^[1-9]\d{0,9}$/.test(fileId)) throw new Refusal("not_found", "There is no such file.");
    const opened = await fileToOpen(actor, productCode, Number(fileId));
    // A page elsewhere can make a browser ask, but nobody opened the file by that.
    const note = isForeignRead(request) ? () => Promise.resolve() : () => noteOpening(actor, opened.file);

    // A file that is not there is a fault of the installation, not half a download.
    await stat(opened.path);

    return new Response(streamOf(wholeFile(opened, note)), { headers: headersOf(opened) });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    throw error;
  }
}

/** Noted before the last bytes leave, so that who has them all finds it noted; who breaks off before has opened nothing. */
async function* wholeFile({ file, path }: OpenedFile, note: () => Promise<void>): AsyncGenerator<Uint8Array> {
  let sent = 0;
  for await (const bytes of createReadStream(path)) {
    const part: Buffer = bytes;
    sent += part.length;
    if (sent >= file.size) await note();
    yield part;
  }
}

/** Reads no byte before somebody asks for it: a request for the headers alone opens no file. */
function streamOf(parts: AsyncGenerator<Uint8Array>): ReadableStream<Uint8Array> {
  return new ReadableStream(
    {
      async pull(controller) {
        const next = await parts.next();
        if (next.done) controller.close();
        else controller.enqueue(next.value);
      },
      async cancel() {
        await parts.return(undefined);
      },
    },
    { highWaterMark: 0 },
  );
}

function headersOf({ file }: OpenedFile): Record<string, string> {
  const { plain, encoded } = downloadName(file);

  return {
    "content-type": file.mediaType.startsWith("text/") ? `${file.mediaType}; charset=utf-8` : file.mediaType,
    "content-length": String(file.size),
    "content-disposition": `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`,
    "content-security-policy": DOWNLOAD_POLICY,
    "x-content-type-options": "nosniff",
    "cache-control": "private, no-store",
    "accept-ranges": "none",
  };
}

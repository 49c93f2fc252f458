import type { AddedFile } from "@/lib/proposals/files/add-file";
import { fileSizeText, LONGEST_FILE } from "@/lib/vocabulary/files";

export interface FileToSend {
  productCode: string;
  proposalId: number;
  place: "working_copy" | "proposal";
  sourceDate: string;
  file: File;
}

export type SentFile = { ok: true; file: AddedFile } | { ok: false; sentence: string };

/** Sends a file and tells how far it is; by the one browser interface that says so for what goes out. */
export function sendFile(
  { productCode, proposalId, place, sourceDate, file }: FileToSend,
  onSent: (share: number) => void,
  signal: AbortSignal,
): Promise<SentFile> {
  if (file.size > LONGEST_FILE) {
    return Promise.resolve(no(`${file.name} has ${fileSizeText(file.size)}; a file has at most 25 MB.`));
  }
  const query = new URLSearchParams({ proposal: String(proposalId), place, sourceDate, name: file.name });

  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open("POST", `/api/products/${productCode}/files?${query}`);
    request.responseType = "json";
    request.upload.onprogress = ({ loaded }) => onSent(loaded / Math.max(1, file.size));
    request.onload = () => resolve(answered(request));
    request.onerror = () => resolve(no("The file did not get through. Check the connection and send it again."));
    request.onabort = () => resolve(no("Sending was broken off; nothing was kept."));
    signal.addEventListener("abort", () => request.abort());
    request.send(file);
  });
}

function answered({ status, response }: XMLHttpRequest): SentFile {
  if (status === 200) return { ok: true, file: response };

  return no(typeof response?.sentence === "string" ? response.sentence : "The server did not answer as it should.");
}

function no(sentence: string): SentFile {
  return { ok: false, sentence };
}

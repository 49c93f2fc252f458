import { readFile } from "node:fs/promises";
import { text } from "node:stream/consumers";
import { hasRefusal } from "@/lib/evaluation/document/answer";
import { evaluateDocument } from "@/lib/evaluation/document/evaluate-document";
import { faultLine, faultsOf } from "@/lib/evaluation/document/faults";
import { EvaluationDocument } from "@/lib/evaluation/document/schema";

const INVALID_DOCUMENT = 2;
const REFUSED_ITEM = 3;

/** Evaluates one JSON document, from the named file or standard input, by the code that the application uses. */
async function main(file: string | undefined): Promise<void> {
  const source = await readSource(file);
  const document = source === null ? undefined : parseJson(source);
  if (document === undefined) return;

  const parsed = EvaluationDocument.safeParse(document.value);
  if (!parsed.success) {
    return refuse(faultsOf(parsed.error).map(faultLine));
  }
  const answer = evaluateDocument(parsed.data);
  process.stdout.write(`${JSON.stringify(answer, null, 2)}\n`);
  if (hasRefusal(answer)) process.exitCode = REFUSED_ITEM;
}

async function readSource(file: string | undefined): Promise<string | null> {
  try {
    return file === undefined || file === "-" ? await text(process.stdin) : await readFile(file, "utf8");
  } catch (error) {
    refuse([`document: cannot be read (${error instanceof Error ? error.message : String(error)})`]);
    return null;
  }
}

function parseJson(source: string): { value: unknown } | undefined {
  try {
    return { value: JSON.parse(source) };
  } catch (error) {
    refuse([`document: must be JSON (${oneLine(error)})`]);
    return undefined;
  }
}

function oneLine(error: unknown): string {
  return (error instanceof Error ? error.message : String(error)).replace(/\s+/g, " ");
}

/** One line per fault on standard error; the exit code is set, not forced, so that every line is written. */
function refuse(lines: readonly string[]): void {
  process.stderr.write(`${lines.join("\n")}\n`);
  process.exitCode = INVALID_DOCUMENT;
}

void main(process.argv[2]);

import type { HttpPerson } from "@/tests/e2e/support/http-person";
import { POINTS } from "@/tests/support/large-budget";

const WARM_UP = 60;
const ROUNDS = 150;

/** Milliseconds over HTTP, medians, taken by turns: what other programs do meanwhile then weighs on all alike. */
export async function sheetTimes(reader: HttpPerson) {
  const newest = await newestIssue(reader);
  const empty = () => timed(reader, "/api/signed-in");
  for (let round = 0; round < WARM_UP; round += 1) await empty();

  // The first time that anybody asks for that sheet at all; earlier issues are sheets of their own.
  const firsts: number[] = [];
  for (const point of POINTS) {
    for (let issue = newest; issue > 1; issue -= 1)
      firsts.push((await timed(reader, address("LB-5", issue, point))).time);
  }
  const { tag, bytes } = await timed(reader, address("LB-5", newest, "OP-1"));
  const times = { empty: [] as number[], later: [] as number[], known: [] as number[], one: [] as number[] };
  for (let round = 0; round < WARM_UP + ROUNDS; round += 1) {
    const taken = {
      empty: await empty(),
      later: await timed(reader, address("LB-5", newest, "OP-1")),
      known: await timed(reader, address("LB-5", newest, "OP-1"), { "if-none-match": tag }),
      one: await timed(reader, address("LB-1", newest, "OP-1")),
    };
    if (taken.known.status !== 304 || taken.later.status !== 200) throw new Error("a sheet was not answered as asked");
    if (round < WARM_UP) continue;
    times.empty.push(taken.empty.time);
    times.later.push(taken.later.time);
    times.known.push(taken.known.time);
    times.one.push(taken.one.time);
  }
  return {
    first: median(firsts),
    empty: median(times.empty),
    later: median(times.later),
    known: median(times.known),
    one: median(times.one),
    bytes,
  };
}

function address(productCode: string, issue: number, point: string): string {
  return `/api/products/${productCode}/budget?issue=${issue}&point=${point}`;
}

async function newestIssue(reader: HttpPerson): Promise<number> {
  const answer = await fetch(`${reader.address}/api/products/LB-5/newest-issue`, {
    headers: { cookie: reader.cookie },
  });
  const { issue } = (await answer.json()) as { issue: number };
  return issue;
}

/** Until the last byte is there, still packed: unpacking is the reader's. */
async function timed({ address: base, cookie }: HttpPerson, path: string, headers: Record<string, string> = {}) {
  const before = performance.now();
  const answer = await fetch(`${base}${path}`, { headers: { cookie, "accept-encoding": "gzip", ...headers } });
  const body = await answer.arrayBuffer();
  const time = performance.now() - before;
  if (answer.status >= 400) throw new Error(`${path}: ${answer.status}`);
  const bytes = Number(answer.headers.get("content-length") ?? body.byteLength);
  return { time, status: answer.status, tag: answer.headers.get("etag") ?? "", bytes };
}

function median(times: readonly number[]): number {
  return times.toSorted((one, other) => one - other)[Math.floor(times.length / 2)] ?? NaN;
}

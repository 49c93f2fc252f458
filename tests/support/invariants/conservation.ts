import { allProducts, rows, type ProductKey } from "./rows";

interface Revision {
  kind: string;
  number: string;
  issue: number;
  retired: number;
  body: string;
}

interface Sheet {
  rows: { kind: string; number: string; hundredths: number }[];
  unallocatedHundredths: number;
}

/**
 * 6: Σ allocations + unallocated + reserve = limit at the reference operating point, unallocated ≥ 0, every ceiling
 * kept; recounted at every issue from the stored bodies.
 */
export async function conservationFaults(): Promise<string[]> {
  const faults: string[] = [];
  for (const product of await allProducts()) faults.push(...(await faultsOfProduct(product)));
  return faults;
}

async function faultsOfProduct({ id, code }: ProductKey): Promise<string[]> {
  const revisions = await rows<Revision>(
    `SELECT l.kind, l.number, r.issue, r.retired, r.body FROM line_revisions r JOIN lines l ON l.id = r.line_id
     WHERE l.product_id = :id ORDER BY r.issue`,
    { id },
  );
  const issues = await rows<{ number: number }>("SELECT number FROM issues WHERE product_id = :id", { id });
  return issues.flatMap(({ number }) => {
    const standing = new Map<string, Revision>();
    for (const revision of revisions) {
      if (revision.issue <= number) standing.set(`${revision.kind} ${revision.number}`, revision);
    }
    return faultsAt([...standing.values()]).map((fault) => `6: ${code} issue ${number}: ${fault}`);
  });
}

function faultsAt(lines: readonly Revision[]): string[] {
  const bodyOf = (kind: string, number?: string) => {
    const line = lines.find((each) => each.kind === kind && (number === undefined || each.number === number));
    return line && line.retired === 0 ? JSON.parse(line.body) : null;
  };
  const sheet: Sheet = bodyOf("allocations");
  const terms = bodyOf("terms");
  const limit: number = bodyOf("operating_point", terms.referenceOperatingPoint).limitHundredths;
  const reserve: number = terms.reserves.find(
    (row: { operatingPoint: string }) => row.operatingPoint === terms.referenceOperatingPoint,
  ).hundredths;

  const parentOf = ({ kind, number }: { kind: string; number: string }): string | null => {
    const body = bodyOf(kind, number);
    return (kind === "item" ? body?.group : body?.parent) ?? null;
  };
  const nearestAllocatedGroup = (row: { kind: string; number: string }): string | null => {
    for (let group = parentOf(row); group !== null; group = parentOf({ kind: "group", number: group })) {
      if (sheet.rows.some(({ kind, number }) => kind === "group" && number === group)) return group;
    }
    return null;
  };

  const sum = (each: readonly { hundredths: number }[]) =>
    each.reduce((total, { hundredths }) => total + hundredths, 0);
  const top = sheet.rows.filter((row) => nearestAllocatedGroup(row) === null);
  const total = sum(top) + sheet.unallocatedHundredths + reserve;
  return [
    ...(total === limit ? [] : [`allocations, unallocated and reserve make ${total}, the limit is ${limit}.`]),
    ...(sheet.unallocatedHundredths >= 0 ? [] : [`unallocated is ${sheet.unallocatedHundredths}.`]),
    ...sheet.rows
      .filter(({ kind }) => kind === "group")
      .filter(
        ({ number, hundredths }) => sum(sheet.rows.filter((r) => nearestAllocatedGroup(r) === number)) > hundredths,
      )
      .map(({ number }) => `the members of group ${number} hold more than its ceiling.`),
    ...sheet.rows
      .filter(({ kind, number }) => bodyOf(kind, number) === null)
      .map(({ kind, number }) => `${kind} ${number} is not in force and has an allocation.`),
    ...sheet.rows
      .filter(({ kind, number, hundredths }) => kind === "item" && bodyOf(kind, number)?.saving && hundredths > 0)
      .map(({ number }) => `the saving ${number} has an allocation above 0.`),
  ];
}

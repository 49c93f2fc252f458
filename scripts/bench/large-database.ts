// Run with a data folder of its own: fills it with two large budgets, by the commands that people use.
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { createProduct } from "@/lib/products/create-product";
import { establishProduct } from "@/lib/products/establish-product";
import { giveRole } from "@/lib/products/give-role";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import type { DraftEdit } from "@/lib/proposals/schema";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { emailOf, HTTP_PASSWORD, type PersonName } from "@/tests/e2e/support/http-people";
import { actor, approve, clock, setScene } from "@/tests/e2e/support/scene-parts";
import { FINISHES, groupSketches, itemSketches, POINTS, pointSketch } from "@/tests/support/large-budget";
import { LARGE_BUDGETS } from "./large-budgets";

const ROLES = [
  ["tansy", "component_owner"],
  ["ines", "reviewer"],
  ["lusia", "program_manager"],
  ["fenno", "program_manager"],
] as const;

/** As many as a proposal holds. */
const IN_A_PROPOSAL = 200;

setScene(async () => {
  for (const [code, points] of Object.entries(LARGE_BUDGETS)) {
    await openProduct(code);
    await establish(code);
    await fill(code, points);
  }
  process.stdout.write(`${emailOf("tansy")}, “${HTTP_PASSWORD}”\n`);
});

async function openProduct(code: string): Promise<void> {
  const administrator = await actor("ada");
  await createProduct(administrator, { code, name: `Large ${code}`, kind: "vehicle_fairing", timeZone: "UTC" }, clock);
  for (const [name, role] of ROLES) {
    const { userId } = await actor(name);
    await giveRole(administrator, { productCode: code, userId, role, reason: "Bench." }, clock);
  }
}

async function establish(productCode: string): Promise<void> {
  const limits = { name: "Cruise", limitHundredths: 50_000 };
  await establishProduct(
    await actor("lusia"),
    {
      productCode,
      operatingPoint: { number: "OP-1", body: { ...newOperatingPoint(), ...pointSketch("OP-1"), ...limits } },
      terms: { ...newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 1_000 }) },
      password: HTTP_PASSWORD,
    },
    clock,
  );
}

async function fill(productCode: string, points: number): Promise<void> {
  const owner = await actor("tansy");
  const edits = [
    ...POINTS.slice(1, points).map((number) =>
      adding("operating_point", number, { name: number, ...pointSketch(number) }),
    ),
    ...Object.entries(FINISHES).map(([number, body]) => adding("finish", number, body)),
    ...Object.entries(groupSketches()).map(([number, body]) => adding("group", number, body)),
    ...Object.entries(itemSketches(owner.userId)).map(([number, body]) => adding("item", number, body)),
  ];
  for (let from = 0; from < edits.length; from += IN_A_PROPOSAL) {
    await approved(productCode, edits.slice(from, from + IN_A_PROPOSAL));
  }
}

async function approved(productCode: string, edits: DraftEdit[]): Promise<void> {
  const proposer = await actor("fenno");
  const title = `From ${edits[0]?.number} on`;
  const content = { title, reason: "A large budget to be measured.", neededBy: null, edits, transfers: [] };
  const key = `bench-${productCode}-${edits[0]?.number}`;
  const { proposalId } = await startDraft(proposer, { productCode, title, key: `${key}-draft` }, clock);
  await saveDraft(proposer, { proposalId, lockVersion: 0, content }, clock);
  await propose(proposer, { proposalId, lockVersion: 1, key: `${key}-round`, password: null }, clock);
  await signed("ines", proposalId, "reviewer");
  await signed("lusia", proposalId, "program_manager");
}

async function signed(name: PersonName, proposalId: number, capacity: "reviewer" | "program_manager"): Promise<void> {
  const before = performance.now();
  await approve(name, proposalId, capacity);
  process.stdout.write(`${name} signed in ${((performance.now() - before) / 1000).toFixed(1)} s\n`);
}

function adding(kind: DraftEdit["kind"], number: string, body: object): DraftEdit {
  return { operation: "add", kind, number, baseLetter: null, body: { ...body } };
}

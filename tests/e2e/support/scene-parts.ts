import { performAct } from "@/lib/audit/perform-act";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { createProduct } from "@/lib/products/create-product";
import { establishProduct } from "@/lib/products/establish-product";
import { giveRole } from "@/lib/products/give-role";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import type { DraftContent } from "@/lib/proposals/schema";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { createUser } from "@/lib/users/create-user";
import { hashPassword } from "@/lib/users/password";
import { actorById, userByEmail } from "@/lib/users/queries";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import { ROLES, type Capacity, type Role } from "@/lib/vocabulary/roles";
import { closeDatabase, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { shownSheet } from "@/scripts/demo/shown-sheet";
import { point, RESERVE } from "./http-bodies";
import { emailOf, HTTP_PASSWORD, HTTP_PEOPLE, PRODUCT, type PersonName } from "./http-people";

const DAY_MS = 24 * 60 * 60 * 1000;

/** Two months ago, outside the window in which moves of an item add up, and a second later at each act. */
let moment = Date.now() - 60 * DAY_MS;
export const clock = () => new Date((moment += 1000));

/** Runs a scene on the database of the tests: migrated, with the accounts of all. */
export function setScene(scene: () => Promise<void>): void {
  void onDatabase(scene).catch((error: unknown) => {
    process.stderr.write(`${String(error)}\n`);
    process.exitCode = 1;
  });
}

async function onDatabase(scene: () => Promise<void>): Promise<void> {
  await openDatabase();
  try {
    await migrateDatabase();
    await openAccounts();
    await scene();
  } finally {
    await closeDatabase();
  }
}

/** Cheap hashes: what is tested is who is refused, not the strength of a hash. */
async function openAccounts(): Promise<void> {
  const passwordHash = await hashPassword(HTTP_PASSWORD, { logN: 4, r: 8, p: 1 });
  const installation = { userId: null, printedName: "Installation" };
  for (const name of peopleNames()) {
    const account = { email: emailOf(name), name: HTTP_PEOPLE[name].printedName, passwordHash };
    await performAct(installation, clock, { act: "create_account", chain: HOUSE_CHAIN }, (tx, record, at) =>
      createUser({ ...account, isAdministrator: name === "ada" }, { tx, record, at }),
    );
  }
}

export async function openProduct(code: string): Promise<void> {
  const administrator = await actor("ada");
  await createProduct(administrator, { code, name: `Test ${code}`, kind: "vehicle_fairing", timeZone: "UTC" }, clock);
  for (const name of peopleNames()) {
    for (const role of rolesOf(name, code)) {
      const { userId } = await actor(name);
      await giveRole(administrator, { productCode: code, userId, role, reason: "Test." }, clock);
    }
  }
}

function rolesOf(name: PersonName, code: string): readonly Role[] {
  if (code === PRODUCT) return HTTP_PEOPLE[name].roles;
  return name === "otto" ? ROLES : [];
}

export async function establish(): Promise<void> {
  await establishProduct(
    await actor("lusia"),
    {
      productCode: PRODUCT,
      operatingPoint: { number: "OP-1", body: { ...newOperatingPoint(), ...point() } },
      terms: { ...newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: RESERVE }) },
      password: HTTP_PASSWORD,
    },
    clock,
  );
}

let forms = 0;
const formKey = () => `scene-${String(++forms).padStart(6, "0")}`;

/** A draft of that content: its first save. */
export async function drafted(person: Actor, content: DraftContent): Promise<number> {
  const { proposalId } = await startDraft(
    person,
    { productCode: PRODUCT, title: content.title, key: formKey() },
    clock,
  );
  await saveDraft(person, { proposalId, lockVersion: 0, content }, clock);
  return proposalId;
}

/** A proposal in its first round. */
export async function proposed(person: Actor, content: DraftContent): Promise<number> {
  const proposalId = await drafted(person, content);
  await propose(person, { proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
  return proposalId;
}

export async function approve(name: PersonName, proposalId: number, capacity: Capacity): Promise<void> {
  const shown = await shownSheet(proposalId, clock);
  const signed = { decision: "approve", capacity, meaning: "Checked", deputyForId: null } as const;
  await signProposal(await actor(name), { proposalId, ...shown, ...signed, password: HTTP_PASSWORD }, clock);
}

export async function actor(name: PersonName): Promise<Actor> {
  const user = await userByEmail(emailOf(name));
  const account = user && (await actorById(user.id, clock().toISOString()));
  if (!account) throw new Error(`${name} has no account`);
  return account.actor;
}

function peopleNames(): PersonName[] {
  return Object.keys(HTTP_PEOPLE).filter((name): name is PersonName => name in HTTP_PEOPLE);
}

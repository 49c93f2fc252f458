// A script of its own: the domain cannot be loaded into the process of the tests.
import { performAct } from "@/lib/audit/perform-act";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { createProduct } from "@/lib/products/create-product";
import { establishProduct } from "@/lib/products/establish-product";
import { giveRole } from "@/lib/products/give-role";
import { propose } from "@/lib/proposals/propose";
import { saveDraft } from "@/lib/proposals/save-draft";
import { signProposal } from "@/lib/proposals/sign-proposal";
import { startDraft } from "@/lib/proposals/start-draft";
import { createUser } from "@/lib/users/create-user";
import { hashPassword } from "@/lib/users/password";
import { actorById, userByEmail } from "@/lib/users/queries";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import { ROLES, type Capacity, type Role } from "@/lib/vocabulary/roles";
import { closeDatabase, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { shownSheet } from "@/scripts/demo/shown-sheet";
import { adding, bluff, content, point, RESERVE } from "./http-bodies";
import { emailOf, HTTP_PASSWORD, HTTP_PEOPLE, OTHER_PRODUCT, PRODUCT, type PersonName } from "./http-people";

void setScene().catch((error: unknown) => {
  process.stderr.write(`${String(error)}\n`);
  process.exitCode = 1;
});

const DAY_MS = 24 * 60 * 60 * 1000;

/** Two months ago, outside the window in which moves of an item add up, and a second later at each act. */
let moment = Date.now() - 60 * DAY_MS;
const clock = () => new Date((moment += 1000));

/** Two products, one of them established and with an item for each kind of test. */
async function setScene(): Promise<void> {
  await openDatabase();
  try {
    await migrateDatabase();
    await openAccounts();
    await openProduct(PRODUCT);
    await openProduct(OTHER_PRODUCT);
    await establish();
    await approveItems();
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

async function openProduct(code: string): Promise<void> {
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

async function establish(): Promise<void> {
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

/**
 * Items 010 and 020 that keep their first letter, 040 of a reviewer, and those of which one test each approves a
 * revision: 030 beside an open sheet, 050 that overtakes, 060 that two persons sign at one moment.
 */
async function approveItems(): Promise<void> {
  const [tansy, odo, roel] = [await actor("tansy"), await actor("odo"), await actor("roel")];
  const items = Object.entries({ "010": tansy, "020": odo, "030": odo, "040": roel, "050": tansy, "060": tansy });
  const edits = items.map(([number, { userId }]) => adding(number, bluff(userId, 0.5)));

  const fenno = await actor("fenno");
  const { proposalId } = await startDraft(fenno, { productCode: PRODUCT, title: "Items", key: "scene-draft" }, clock);
  await saveDraft(fenno, { proposalId, lockVersion: 0, content: content(edits) }, clock);
  await propose(fenno, { proposalId, lockVersion: 1, key: "scene-propose", password: null }, clock);
  await approve("ines", proposalId, "reviewer");
  await approve("lusia", proposalId, "program_manager");
}

async function approve(name: PersonName, proposalId: number, capacity: Capacity): Promise<void> {
  const shown = await shownSheet(proposalId, clock);
  const signed = { decision: "approve", capacity, meaning: "Checked", deputyForId: null } as const;
  await signProposal(await actor(name), { proposalId, ...shown, ...signed, password: HTTP_PASSWORD }, clock);
}

async function actor(name: PersonName): Promise<Actor> {
  const user = await userByEmail(emailOf(name));
  const account = user && (await actorById(user.id, clock().toISOString()));
  if (!account) throw new Error(`${name} has no account`);
  return account.actor;
}

function peopleNames(): PersonName[] {
  return Object.keys(HTTP_PEOPLE).filter((name): name is PersonName => name in HTTP_PEOPLE);
}

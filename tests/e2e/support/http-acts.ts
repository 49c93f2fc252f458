import { randomUUID } from "node:crypto";
import { z } from "zod";
import type { DraftContent } from "@/lib/proposals/schema";
import type { Capacity } from "@/lib/vocabulary/roles";
import { callAction } from "./http-action";
import { routeAnswer, valueOf, type HttpAnswer } from "./http-answer";
import { HTTP_PASSWORD, PRODUCT } from "./http-people";
import type { HttpPerson } from "./http-person";

/** One render of a form. */
export function formKey(): string {
  return randomUUID();
}

export function startDraft(person: HttpPerson, productCode = PRODUCT, key = formKey()): Promise<HttpAnswer> {
  const page = `/products/${productCode}/proposals`;
  return callAction(person, { name: "startDraftAction", page }, { productCode, title: "", key });
}

export async function saveDraft(
  { address, cookie }: HttpPerson,
  saved: { proposalId: number; lockVersion: number; content: DraftContent },
  { headers = {}, productCode = PRODUCT }: { headers?: Record<string, string>; productCode?: string } = {},
): Promise<HttpAnswer> {
  const response = await fetch(`${address}/api/products/${productCode}/drafts/${saved.proposalId}`, {
    method: "PUT",
    headers: { "content-type": "application/json", cookie, ...headers },
    body: JSON.stringify(saved),
  });
  return routeAnswer(response);
}

export function share(person: HttpPerson, proposalId: number, userId: number): Promise<HttpAnswer> {
  const page = `/products/${PRODUCT}/proposals/draft-${proposalId}/edit`;
  return callAction(person, { name: "shareDraftAction", page }, { proposalId, userId });
}

export function propose(
  person: HttpPerson,
  { proposalId, lockVersion }: { proposalId: number; lockVersion: number },
  { key = formKey(), headers = {} }: { key?: string; headers?: Record<string, string> } = {},
): Promise<HttpAnswer> {
  const page = `/products/${PRODUCT}/proposals/draft-${proposalId}/edit`;
  const input = { proposalId, lockVersion, key, password: HTTP_PASSWORD };
  return callAction(person, { name: "proposeAction", page }, input, headers);
}

/** A draft of that content; it may be anything that can be saved. */
export async function drafted(person: HttpPerson, content: DraftContent) {
  const { proposalId } = valueOf(await startDraft(person), z.object({ proposalId: z.int() }));
  const saved = await saveDraft(person, { proposalId, lockVersion: 0, content });
  const { lockVersion } = valueOf(saved, z.object({ outcome: z.literal("saved"), lockVersion: z.int() }));
  return { proposalId, lockVersion };
}

export interface SubmittedProposal {
  proposalId: number;
  key: string;
}

/** A proposal in its first round. */
export async function proposed(person: HttpPerson, content: DraftContent): Promise<SubmittedProposal> {
  const draft = await drafted(person, content);
  const { key } = valueOf(await propose(person, draft), z.object({ key: z.string() }));
  return { proposalId: draft.proposalId, key };
}

export interface ShownSheet {
  roundHash: string;
  textHash: string;
}

/** What stands before a signer: the two hashes that their page was sent with. */
export async function sheetBefore(person: HttpPerson, { key }: SubmittedProposal): Promise<ShownSheet> {
  const page = await read(person, `/products/${PRODUCT}/proposals/${key}`);
  const hash = (field: string) => {
    const [, value] = new RegExp(`\\\\"${field}\\\\":\\\\"([0-9a-f]{64})\\\\"`).exec(page.text) ?? [];
    if (value === undefined) throw new Error(`The page of proposal ${key} (${page.status}) holds no ${field}.`);
    return value;
  };
  return { roundHash: hash("roundHash"), textHash: hash("textHash") };
}

export function sign(
  person: HttpPerson,
  { proposalId, key }: SubmittedProposal,
  shown: ShownSheet,
  { capacity = "reviewer", password = HTTP_PASSWORD }: { capacity?: Capacity; password?: string } = {},
): Promise<HttpAnswer> {
  const page = `/products/${PRODUCT}/proposals/${key}`;
  const signature = { decision: "approve", capacity, meaning: "Checked", deputyForId: null, password };
  return callAction(person, { name: "signProposalAction", page }, { proposalId, ...shown, ...signature });
}

/** Reads the sheet and signs what stands there. */
export async function signs(person: HttpPerson, proposal: SubmittedProposal, capacity: Capacity = "reviewer") {
  return sign(person, proposal, await sheetBefore(person, proposal), { capacity });
}

/** Brings a proposal onto that issue with one field settled for what it proposes itself. */
export function carryForward(
  person: HttpPerson,
  { proposalId, key }: SubmittedProposal,
  onto: { lockVersion: number; ontoIssue: number; item: string; field: string },
): Promise<HttpAnswer> {
  const page = `/products/${PRODUCT}/proposals/${key}/carry-forward`;
  const { lockVersion, ontoIssue, item, field } = onto;
  const settled = [{ kind: "item", number: item, field, choice: "yours", why: "Measured again since." }];
  const input = { proposalId, lockVersion, ontoIssue, settled, key: formKey() };
  return callAction(person, { name: "carryForwardAction", page }, input);
}

/** "Sign out everywhere" of the account page. */
export function endSessions(person: HttpPerson): Promise<HttpAnswer> {
  return callAction(person, { name: "endSessionsAction", page: "/account" }, {});
}

export function askForAction(person: HttpPerson, { proposalId, key }: SubmittedProposal): Promise<HttpAnswer> {
  const page = `/products/${PRODUCT}/proposals/${key}`;
  const where = { proposalId, parentId: null, line: null, field: null };
  const remark = { ...where, text: "Name the gauge.", suggestion: null, asksForAction: true, key: formKey() };
  return callAction(person, { name: "addRemarkAction", page }, remark);
}

export interface AskedRun {
  issue: number;
  operatingPoint: string;
  draws: number;
  seed: number;
}

/** Asks for a Monte Carlo run; the value of one that is kept is its lines. */
export async function run(
  { address, cookie }: HttpPerson,
  asked: AskedRun,
  headers: Record<string, string> = {},
): Promise<HttpAnswer> {
  const response = await fetch(`${address}/api/products/${PRODUCT}/monte-carlo`, {
    method: "POST",
    headers: { "content-type": "application/json", cookie, ...headers },
    body: JSON.stringify(asked),
  });
  if (!response.ok) return routeAnswer(response);
  const lines = (await response.text()).trimEnd().split("\n");
  return { ok: true, status: response.status, value: lines.map((line): unknown => JSON.parse(line)) };
}

/** What a person is answered who asks for a page or a file. */
export async function read({ address, cookie }: HttpPerson, page: string): Promise<{ status: number; text: string }> {
  const response = await fetch(`${address}${page}`, { redirect: "manual", headers: { cookie } });
  return { status: response.status, text: await response.text() };
}

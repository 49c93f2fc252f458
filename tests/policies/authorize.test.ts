import { describe, expect, it } from "vitest";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { ROLES } from "@/lib/vocabulary/roles";
import { authorize, isAllowed } from "@/policies/authorize";
import {
  DRAFT_ACTIONS,
  INSTALLATION_ACTIONS,
  PRODUCT_ACTIONS,
  PROPOSAL_ACTIONS,
  ROUND_ACTIONS,
  refusalSentence,
  type Question,
} from "@/policies/questions";

const HERE = 7;
const ELSEWHERE = 8;
const ME = 1;
const OTHER = 2;

/** Columns of the table: owner, reviewer, program manager, auditor, administrator, all roles but in another product. */
type Who = "owner" | "reviewer" | "manager" | "auditor" | "administrator" | "elsewhere";
const WHO: Who[] = ["owner", "reviewer", "manager", "auditor", "administrator", "elsewhere"];
const person = (roles: Actor["memberships"], isAdministrator = false): Actor => ({
  userId: ME,
  printedName: "M. E.",
  isAdministrator,
  memberships: roles,
});
const PEOPLE: Record<Who, Actor> = {
  owner: person([{ productId: HERE, role: "component_owner" }]),
  reviewer: person([{ productId: HERE, role: "reviewer" }]),
  manager: person([{ productId: HERE, role: "program_manager" }]),
  auditor: person([{ productId: HERE, role: "auditor" }]),
  administrator: person([], true),
  elsewhere: person(ROLES.map((role) => ({ productId: ELSEWHERE, role }))),
};

const house = (action: (typeof INSTALLATION_ACTIONS)[number]): Question => ({ on: "Installation", action });
const product = (action: (typeof PRODUCT_ACTIONS)[number]): Question => ({ on: "Product", action, productId: HERE });
const line = (
  action: "add" | "revise" | "retire" | "reinstate",
  kind: "item" | "group" | "operating_point" | "finish" | "allocations" | "terms",
  ownerBefore: number | null = null,
  ownerAfter: number | null = ownerBefore,
): Question => ({ on: "Line", action, productId: HERE, kind, ownerBefore, ownerAfter });
const transfer = (giverOwner: number | null, receiverOwner: number | null): Question => ({
  on: "Transfer",
  action: "ask",
  productId: HERE,
  giverOwner,
  receiverOwner,
});
const draft = (action: (typeof DRAFT_ACTIONS)[number], proposerId: number, isEditor = false): Question => ({
  on: "Draft",
  action,
  productId: HERE,
  proposerId,
  isEditor,
});
const proposal = (action: (typeof PROPOSAL_ACTIONS)[number], proposerId: number, isEditor = false): Question => ({
  on: "Proposal",
  action,
  productId: HERE,
  proposerId,
  isEditor,
});
const round = (action: (typeof ROUND_ACTIONS)[number], asDeputy = false): Question => ({
  on: "Round",
  action,
  productId: HERE,
  asDeputy,
});
const account = (userId: number): Question => ({ on: "Account", action: "keep_preferences", userId });
const takeBack = (signerId: number): Question => ({ on: "Signature", action: "take_back", productId: HERE, signerId });
const endDeputyship = (holderId: number): Question => ({
  on: "Deputyship",
  action: "end",
  productId: HERE,
  holderId,
});
const settle = (authorId: number, hasPart: boolean): Question => ({
  on: "Remark",
  action: "settle",
  productId: HERE,
  authorId,
  hasPart,
});

const voidFile = (addedById: number): Question => ({ on: "File", action: "void", productId: HERE, addedById });

const MEMBERS = "owner reviewer manager auditor";
const TAKING_PART = "owner reviewer manager";
const PROPOSING = "owner manager";

/** Every action with who may do it, as product.md says under "The people" and "The words". */
const TABLE: [string, Question, string][] = [
  ["create a product", house("create_product"), "administrator"],
  ["give a role", house("give_role"), "administrator"],
  ["end a role", house("end_role"), "administrator"],
  ["create an account", house("create_account"), "administrator"],
  ["close an account", house("deactivate_account"), "administrator"],
  ["see the accounts", house("read_accounts"), "administrator"],
  ["read the house's history", house("read_house_history"), "auditor administrator elsewhere"],
  ["keep one's own preferences", account(ME), `${MEMBERS} administrator elsewhere`],
  ["keep another's preferences", account(OTHER), ""],
  ["see a product in the register", product("see"), `${MEMBERS} administrator`],
  ["read a budget", product("read_budget"), MEMBERS],
  ["read the history", product("read_history"), MEMBERS],
  ["see who looked at a history", product("read_lookings"), "manager auditor"],
  ["take an export", product("export"), MEMBERS],
  ["establish", product("establish"), "manager"],
  ["make a baseline", product("make_baseline"), "manager"],
  ["start a draft", product("start_draft"), PROPOSING],
  ["make a remark", product("remark"), TAKING_PART],
  ["object", product("object"), TAKING_PART],
  ["run Monte Carlo", product("run_monte_carlo"), TAKING_PART],
  ["add a file", product("add_file"), TAKING_PART],
  ["void an own file", voidFile(ME), TAKING_PART],
  ["void another's file", voidFile(OTHER), "manager"],
  ["name the reviewer", product("assign_reviewer"), "manager"],
  ["name a deputy", product("name_deputy"), "reviewer manager"],
  ["revise an item of one's own", line("revise", "item", ME), PROPOSING],
  ["hand an item of one's own over", line("revise", "item", ME, OTHER), PROPOSING],
  ["retire an item of one's own", line("retire", "item", ME), PROPOSING],
  ["reinstate an item of one's own", line("reinstate", "item", ME), PROPOSING],
  ["add an item one will own", line("add", "item", null, ME), PROPOSING],
  ["add an item for another", line("add", "item", null, OTHER), "manager"],
  ["revise another's item", line("revise", "item", OTHER), "manager"],
  ["take another's item over", line("revise", "item", OTHER, ME), "manager"],
  ["retire another's item", line("retire", "item", OTHER), "manager"],
  ["reinstate another's item", line("reinstate", "item", OTHER), "manager"],
  ["add a group", line("add", "group"), "manager"],
  ["revise a group", line("revise", "group"), "manager"],
  ["revise an operating point", line("revise", "operating_point"), "manager"],
  ["retire a finish", line("retire", "finish"), "manager"],
  ["revise the terms", line("revise", "terms"), "manager"],
  ["revise the allocations sheet", line("revise", "allocations"), "manager"],
  ["ask a transfer from an own item", transfer(ME, OTHER), PROPOSING],
  ["ask a transfer to an own item from the unallocated rest", transfer(null, ME), PROPOSING],
  ["ask a transfer between others", transfer(OTHER, null), "manager"],
  ["ask a transfer between groups and the rest", transfer(null, null), "manager"],
  ["read an own draft", draft("read", ME), TAKING_PART],
  ["read a draft as co-editor", draft("read", OTHER, true), TAKING_PART],
  ["read another's draft", draft("read", OTHER), ""],
  ["edit an own draft", draft("edit", ME), PROPOSING],
  ["edit a draft as co-editor", draft("edit", OTHER, true), PROPOSING],
  ["edit another's draft", draft("edit", OTHER), ""],
  ["share an own draft", draft("share", ME), PROPOSING],
  ["share a draft as co-editor", draft("share", OTHER, true), ""],
  ["withdraw an own draft", draft("withdraw", ME), TAKING_PART],
  ["withdraw another's draft", draft("withdraw", OTHER, true), ""],
  ["propose an own draft", draft("propose", ME), PROPOSING],
  ["propose a draft as co-editor", draft("propose", OTHER, true), PROPOSING],
  ["propose another's draft", draft("propose", OTHER), ""],
  ["read a proposal", proposal("read", OTHER), MEMBERS],
  ["revise an own proposal", proposal("edit", ME), PROPOSING],
  ["revise a proposal as co-editor", proposal("edit", OTHER, true), PROPOSING],
  ["revise another's proposal", proposal("edit", OTHER), ""],
  ["submit an own proposal again", proposal("propose", ME), PROPOSING],
  ["withdraw an own proposal", proposal("withdraw", ME), TAKING_PART],
  ["withdraw another's proposal", proposal("withdraw", OTHER), "manager"],
  ["carry an own proposal forward", proposal("carry_forward", ME), PROPOSING],
  ["carry a proposal forward as co-editor", proposal("carry_forward", OTHER, true), PROPOSING],
  ["carry another's proposal forward", proposal("carry_forward", OTHER), ""],
  ["sign as reviewer", round("sign_as_reviewer"), "reviewer"],
  ["sign as program manager", round("sign_as_program_manager"), "manager"],
  ["disapprove", round("disapprove"), "manager"],
  ["sign as a reviewer's deputy", round("sign_as_reviewer", true), TAKING_PART],
  ["sign as a program manager's deputy", round("sign_as_program_manager", true), TAKING_PART],
  ["take an own approval back", takeBack(ME), TAKING_PART],
  ["take another's approval back", takeBack(OTHER), ""],
  ["end a deputyship one named", endDeputyship(ME), TAKING_PART],
  ["end another's deputyship", endDeputyship(OTHER), ""],
  ["settle an own request for action", settle(ME, true), TAKING_PART],
  ["settle another's request without part in it", settle(OTHER, false), "manager"],
  ["settle another's request on a proposal of one's own", settle(OTHER, true), ""],
];

describe("who may do what", () => {
  it.each(TABLE)("%s", (_name, question, expected) => {
    const allowed = WHO.filter((who) => isAllowed(PEOPLE[who], question));
    expect(allowed.join(" ")).toBe(expected);
  });

  it("has a row for every action", () => {
    const asked = new Set(TABLE.map(([, { on, action }]) => `${on} ${action}`));
    const all = [
      ...INSTALLATION_ACTIONS.map((action) => `Installation ${action}`),
      ...PRODUCT_ACTIONS.map((action) => `Product ${action}`),
      ...DRAFT_ACTIONS.map((action) => `Draft ${action}`),
      ...PROPOSAL_ACTIONS.map((action) => `Proposal ${action}`),
      ...ROUND_ACTIONS.map((action) => `Round ${action}`),
      ...["add", "revise", "retire", "reinstate"].map((action) => `Line ${action}`),
      "Transfer ask",
      "Account keep_preferences",
      "Signature take_back",
      "Deputyship end",
      "Remark settle",
    ];
    expect(all.filter((action) => !asked.has(action))).toEqual([]);
  });

  it("refuses with a sentence that says who may", () => {
    for (const [, question] of TABLE)
      expect(refusalSentence(question)).toMatch(/^(Only|A component owner|You hold no)/);
    expect(() => authorize(PEOPLE.auditor, product("remark"))).toThrow(Refusal);
    expect(() => authorize(PEOPLE.auditor, product("remark"))).toThrow(/a reviewer or a program manager/);
  });

  it("lets an administrator who holds no role sign nothing and read no budget", () => {
    const signing = TABLE.filter(([, { on }]) => on === "Round" || on === "Signature");
    expect(signing.filter(([, question]) => isAllowed(PEOPLE.administrator, question))).toEqual([]);
    expect(isAllowed(PEOPLE.administrator, product("read_budget"))).toBe(false);
  });
});

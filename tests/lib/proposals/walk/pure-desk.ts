import { actorsOf } from "@/lib/proposals/drafting/authorize-change";
import { stateAfter } from "@/lib/proposals/records/moves";
import { Refusal } from "@/lib/vocabulary/refusal";
import type { Role } from "@/lib/vocabulary/roles";
import { authorize } from "@/policies/authorize";
import type { Member } from "@/policies/signing-rights";
import { typed, type Desk } from "./desk";
import { ROLES } from "./model-state";
import { DAY_MS, firstIssues, newest, nobody, picture, PRODUCT, refuse, type Memory } from "./pure-memory";
import { approve, decide, takeBack } from "./pure-signing";
import { carry, demandOpen, propose, questionOf, save, settle, share, start } from "./pure-submission";

const ROLE_OF: Record<string, Role> = {
  ...{ owner: "component_owner", reviewer: "reviewer", manager: "program_manager", auditor: "auditor" },
};

/**
 * The review in memory: the product's moves, policies and arithmetic, asked in the order in which the commands ask
 * them, without a database.
 */
export function pureDesk(): Desk {
  const ids = Object.fromEntries(Object.keys(ROLES).map((name, index) => [name, index + 1]));
  const names = Object.fromEntries(Object.entries(ids).map(([name, id]) => [id, name]));
  const members = Object.entries(ROLES).map(([name, roles]): Member => {
    return { userId: ids[name] ?? 0, printedName: name, roles: roles.map((role) => ROLE_OF[role] ?? "auditor") };
  });
  const actors = actorsOf(PRODUCT, members);
  const desk: Memory = {
    issues: firstIssues(ids),
    proposals: [],
    moves: [],
    members,
    actors,
    now: Date.UTC(2026, 2, 1),
  };
  const actor = (who: string) => actors.find(({ userId }) => userId === ids[who]) ?? nobody();
  const at = (proposal: number) => desk.proposals[proposal] ?? nobody();
  return {
    passDays: (days) => void (desk.now += days * DAY_MS),
    start: (who) => allowed(desk, () => start(desk, actor(who))),
    save: (who, proposal, content) =>
      allowed(desk, () => save(desk, actor(who), at(proposal), typed(content, newest(desk).state, ids))),
    propose: (who, proposal) => allowed(desk, () => propose(desk, actor(who), at(proposal))),
    approve: (who, proposal, capacity) => allowed(desk, () => approve(desk, actor(who), at(proposal), capacity)),
    sendBack: (who, proposal, capacity) =>
      allowed(desk, () => decide(desk, actor(who), at(proposal), "return", capacity)),
    disapprove: (who, proposal) =>
      allowed(desk, () => decide(desk, actor(who), at(proposal), "disapprove", "program_manager")),
    takeBack: (who, proposal) => allowed(desk, () => takeBack(desk, actor(who), at(proposal))),
    withdraw: (who, proposal) =>
      allowed(desk, () => {
        authorize(actor(who), questionOf(at(proposal), actor(who), "withdraw"));
        at(proposal).state = stateAfter(at(proposal).state, "withdraw");
      }),
    share: (who, proposal, to) => allowed(desk, () => share(actor(who), at(proposal), ids[to] ?? 0, members)),
    ask: (who, proposal) =>
      allowed(desk, () => {
        authorize(actor(who), { on: "Product", action: "remark", productId: PRODUCT });
        if (at(proposal).rounds === 0) refuse("wrong_state");
        demandOpen(at(proposal));
        at(proposal).requests.push({ authorId: actor(who).userId, settled: false });
      }),
    settle: (who, proposal, request) => allowed(desk, () => settle(desk, actor(who), at(proposal), request)),
    object: (who, proposal) =>
      allowed(desk, () => {
        authorize(actor(who), { on: "Product", action: "object", productId: PRODUCT });
        stateAfter(at(proposal).state, "approve");
      }),
    carry: (who, proposal, side) => allowed(desk, () => carry(desk, actor(who), at(proposal), side)),
    picture: async () => picture(desk, names),
  };
}

/** A refusal is an answer and leaves everything as it was; anything else that is thrown is a bug. */
async function allowed(desk: Memory, act: () => void): Promise<boolean> {
  const before = structuredClone(desk.proposals);
  try {
    act();
    return true;
  } catch (problem) {
    if (!(problem instanceof Refusal)) throw problem;
    desk.proposals = before;
    return false;
  }
}

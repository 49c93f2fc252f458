import fc from "fast-check";
import { expect } from "vitest";
import type { Desk, Picture } from "./desk";
import { dice, type Dice } from "./dice";
import * as acts from "./model";
import { isConserved, type ModelContent } from "./model-budget";
import { newest, PEOPLE, type Model, type ModelProposal } from "./model-state";
import { randomContent } from "./random-content";

type Tell = (outcome: string) => void;
interface Turn {
  model: Model;
  desk: Desk;
  dice: Dice;
  tell: Tell;
}
interface TurnAt extends Turn {
  proposal: ModelProposal;
  index: number;
}

/** Everything people do, as commands that do it on both sides and compare them. What came of each act is told. */
export function walkCommands(tell: Tell): fc.Arbitrary<fc.AsyncCommand<Model, Desk>>[] {
  const each = (weight: number, name: string, walk: (turn: Turn) => Promise<void>) =>
    Array.from({ length: weight }, () => command(name, walk, tell));
  const at = (states: readonly string[], walk: (turn: TurnAt) => Promise<void>) => async (turn: Turn) => {
    const index = someProposal(turn, states);
    const proposal = turn.model.proposals[index];
    if (proposal) await walk({ ...turn, proposal, index });
  };
  const open = ["draft", "proposed", "returned"];
  return [
    ...each(4, "submit", submits),
    ...each(2, "revise", at(open, revises)),
    ...each(9, "approve", at(["proposed"], approves)),
    ...each(1, "return", at(["proposed"], returns)),
    ...each(1, "disapprove", at(["proposed"], disapproves)),
    ...each(1, "take back", at(["proposed"], takesBack)),
    ...each(1, "withdraw", at(open, withdraws)),
    ...each(1, "share", at(open, shares)),
    ...each(1, "ask", at(["proposed"], asks)),
    ...each(2, "settle", at(["proposed", "returned"], settles)),
    ...each(1, "object", at(["proposed"], objects)),
    ...each(3, "carry", at(open, carries)),
    ...each(1, "pass days", ({ model, desk, dice }) => passDays(model, desk, dice)),
  ];
}

const THROWS = fc.array(fc.nat({ max: 99_999 }), { minLength: 40, maxLength: 40 });

function command(name: string, walk: (turn: Turn) => Promise<void>, tell: Tell) {
  return THROWS.map((thrown): fc.AsyncCommand<Model, Desk> => ({
    check: () => true,
    run: async (model, desk) => {
      await walk({ model, desk, dice: dice(thrown), tell });
      expect(await desk.picture()).toEqual(pictureOf(model));
      expect(isConserved(newest(model))).toBe(true);
    },
    toString: () => `${name}(${thrown.slice(0, 6).join(",")}…)`,
  }));
}

/** Mostly one that the act is for; now and then any. */
function someProposal({ model: { proposals }, dice }: Turn, states: readonly string[]): number {
  if (proposals.length === 0) return -1;
  const fitting = proposals.flatMap(({ state }, index) => (states.includes(state) ? [index] : []));
  return fitting.length > 0 && dice.below(12) > 0 ? dice.one(fitting) : dice.below(proposals.length);
}

/** Mostly somebody who may, so that the walk gets somewhere; else anybody. */
function somebody(dice: Dice, mayAct: (who: string) => unknown): string {
  const able = PEOPLE.filter((who) => mayAct(who) !== null);
  return able.length > 0 && dice.below(4) > 0 ? dice.one(able) : dice.one(PEOPLE);
}

async function both(name: string, tell: Tell, allowed: acts.Allowed, really: Promise<boolean>): Promise<boolean> {
  const isDone = await really;
  tell(`${name}: ${isDone ? "done" : "refused"}`);
  const says = (yes: boolean) => (yes ? "allows" : "refuses");
  expect(`the product ${says(isDone)} to ${name}`).toBe(`the product ${says(allowed !== null)} to ${name}`);
  allowed?.();
  return isDone;
}

async function submits({ model, desk, dice, tell }: Turn): Promise<void> {
  const who = somebody(dice, (each) => acts.start(model, each));
  if (!(await both("start", tell, acts.start(model, who), desk.start(who)))) return;
  const index = model.proposals.length - 1;
  const proposal = model.proposals[index];
  if (!proposal) throw new Error("the draft was not started");
  const content = randomContent(model, dice, who);
  if (!(await saves({ model, desk, dice, tell, proposal, index }, who, content))) return;
  await both("propose", tell, acts.propose(model, who, proposal), desk.propose(who, index));
}

async function saves({ model, desk, tell, proposal, index }: TurnAt, who: string, content: ModelContent) {
  return both("save", tell, acts.save(model, who, proposal, content), desk.save(who, index, content));
}

/** Another change, or what stands there already; what was saved is not always proposed. */
async function revises(turn: TurnAt): Promise<void> {
  const { model, desk, dice, tell, proposal, index } = turn;
  const who = somebody(dice, (each) => acts.save(model, each, proposal, proposal.copy));
  const content = dice.below(4) > 0 ? randomContent(model, dice, who) : proposal.copy;
  if (!(await saves(turn, who, content)) || dice.below(6) === 0) return;
  await both("propose again", tell, acts.propose(model, who, proposal), desk.propose(who, index));
}

async function approves({ model, desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const capacities = ["reviewer", "program_manager"] as const;
  const missing = capacities.filter((each) => PEOPLE.some((who) => acts.approve(model, who, proposal, each) !== null));
  const capacity = dice.one(missing.length > 0 && dice.below(6) > 0 ? missing : capacities);
  const who = somebody(dice, (each) => acts.approve(model, each, proposal, capacity));
  const allowed = acts.approve(model, who, proposal, capacity);
  await both(`approve as ${capacity}`, tell, allowed, desk.approve(who, index, capacity));
}

async function returns({ model, desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const capacity = dice.one(["reviewer", "program_manager"] as const);
  const who = somebody(dice, (each) => acts.sendBack(model, each, proposal, capacity));
  await both("return", tell, acts.sendBack(model, who, proposal, capacity), desk.sendBack(who, index, capacity));
}

async function disapproves({ model, desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const who = somebody(dice, (each) => acts.disapprove(model, each, proposal));
  await both("disapprove", tell, acts.disapprove(model, who, proposal), desk.disapprove(who, index));
}

async function takesBack({ model, desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const who = somebody(dice, (each) => acts.takeBack(model, each, proposal));
  await both("take back", tell, acts.takeBack(model, who, proposal), desk.takeBack(who, index));
}

async function withdraws({ desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const who = somebody(dice, (each) => acts.withdraw(each, proposal));
  await both("withdraw", tell, acts.withdraw(who, proposal), desk.withdraw(who, index));
}

async function shares({ desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const to = dice.one(PEOPLE);
  const who = somebody(dice, (each) => acts.share(each, proposal, to));
  await both("share", tell, acts.share(who, proposal, to), desk.share(who, index, to));
}

async function asks({ desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const who = somebody(dice, (each) => acts.ask(each, proposal));
  await both("ask", tell, acts.ask(who, proposal), desk.ask(who, index));
}

async function settles({ model, desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  if (proposal.requests.length === 0) return;
  const request = dice.below(proposal.requests.length);
  const who = somebody(dice, (each) => acts.settle(model, each, proposal, request));
  await both("settle", tell, acts.settle(model, who, proposal, request), desk.settle(who, index, request));
}

/** An objection moves nothing. */
async function objects({ desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const who = somebody(dice, (each) => acts.object(each, proposal));
  await both("object", tell, acts.object(who, proposal), desk.object(who, index));
}

async function carries({ model, desk, dice, tell, proposal, index }: TurnAt): Promise<void> {
  const side = dice.one(["base", "theirs", "yours"] as const);
  const who = somebody(dice, (each) => acts.carry(model, each, proposal, side));
  await both("carry forward", tell, acts.carry(model, who, proposal, side), desk.carry(who, index, side));
}

async function passDays(model: Model, desk: Desk, dice: Dice): Promise<void> {
  const days = dice.one([1, 5, 12, 31]);
  model.day += days;
  desk.passDays(days);
}

function pictureOf(model: Model): Picture {
  const { limit, reserve, rows, unallocated, items } = newest(model);
  return {
    issues: model.issues.length,
    proposals: model.proposals.map(({ state, rounds }) => ({ state, rounds })),
    ...{ limit, reserve, rows, unallocated },
    items: Object.fromEntries(
      Object.entries(items).map(([number, { owner, force, group, retired, revision }]) => [
        number,
        { owner, force, group, retired, revision },
      ]),
    ),
  };
}

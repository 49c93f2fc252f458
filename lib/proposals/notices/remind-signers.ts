import { performAct } from "@/lib/audit/perform-act";
import { dayIn } from "@/lib/budget/calendar";
import { newestIssue } from "@/lib/budget/load-budget";
import { namesOf } from "@/lib/budget/members";
import { isWorkingDay, workingDaysAfter } from "@/lib/budget/working-days";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inSnapshot } from "@/models/database";
import { Product } from "@/models/product";
import { budgetReader } from "../records/budget-reader";
import { mailFacts, mailMany } from "./mails";
import { proposalsOf, subjectOf, type ProposalRecord } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { isFilled, reviewRound } from "../review/round-review";

/** On the first working day after the date the signers are reminded, on this one the program managers. */
const MANAGER_ON_WORKING_DAY = 3;

/** Nobody acts here but the calendar. */
const CALENDAR = { userId: null, printedName: "Leeboard" };

interface Reminder {
  productCode: string;
  proposal: ProposalRecord;
  occasion: string;
  to: number[];
  neededBy: string;
  proposerName: string;
}

/**
 * A needed-by date that has passed reminds the signers, then the program managers, on working days and once each in a
 * round. Silence never approves. Answers how many proposals were reminded of.
 */
export async function remindSigners(clock: Clock = systemClock): Promise<number> {
  const due = await dueReminders(clock);
  for (const { productCode: chain, proposal, occasion, to, neededBy, proposerName } of due) {
    const subject = subjectOf(proposal);
    await performAct(CALENDAR, clock, { act: "remind_signers", chain, subject }, async (tx, record, at) => {
      const data = { ...mailFacts(proposal), proposerName, neededBy };
      const sent = await mailMany({ tx, at, proposal }, { template: "reminder", occasion, to, except: null, data });
      if (sent > 0) record({ act: "remind_signers", subject, now: { neededBy, persons: sent } });
    });
  }
  return due.length;
}

function dueReminders(clock: Clock): Promise<Reminder[]> {
  return inSnapshot(async (tx) => {
    const moment = clock();
    const due: Reminder[] = [];
    for (const { id, timeZone } of await Product.findAll({ transaction: tx })) {
      const today = dayIn(timeZone, moment);
      if (!isWorkingDay(today) || (await newestIssue(id, tx)) === null) continue;
      const budgets = budgetReader(id, tx);
      const names = new Map((await namesOf(id, tx)).map((person) => [person.id, person.name]));
      for (const proposal of (await proposalsOf(id, tx)).filter(({ state }) => state === "proposed")) {
        const round = await roundOf(proposal.id, proposal.round, tx);
        if (!round || round.neededBy === null || today <= round.neededBy) continue;
        const review = await reviewRound(proposal, round, budgets, { at: moment.toISOString(), tx });
        const open = review.routing.filter((each) => !isFilled(each, review.approvals, round));
        const common = { productCode: proposal.productCode, proposal, neededBy: round.neededBy };
        const reminder = { ...common, proposerName: names.get(proposal.proposerId) ?? "" };
        const signers = open.flatMap(({ maySign }) => maySign.map(({ userId }) => userId));
        due.push({ ...reminder, occasion: `reminded in round ${round.number}`, to: signers });
        if (workingDaysAfter(round.neededBy, today) < MANAGER_ON_WORKING_DAY) continue;
        const managers = review.signing.members.filter(({ roles }) => roles.includes("program_manager"));
        const to = managers.map(({ userId }) => userId);
        due.push({ ...reminder, occasion: `manager reminded in round ${round.number}`, to });
      }
    }
    return due;
  });
}

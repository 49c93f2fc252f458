import { z } from "zod";
import {
  drafted,
  propose,
  proposed,
  saveDraft,
  share,
  sheetBefore,
  sign,
  startDraft,
  type SubmittedProposal,
} from "../support/http-acts";
import { valueOf } from "../support/http-answer";
import { bluff, content, revising } from "../support/http-bodies";
import { OTHER_PRODUCT } from "../support/http-people";
import type { HttpPerson } from "../support/http-person";
import { test } from "../support/http-test";

const REVIEWERS_SIGN = "Only a reviewer of this product may sign in this capacity.";
const MANAGERS_SIGN = "Only a program manager of this product may sign in this capacity.";

/** A small change of an item that is approved by a reviewer alone. */
function smallChange(owner: HttpPerson, item: string) {
  return content([revising(item, bluff(owner.userId, 0.49))]);
}

function ownership(item: string) {
  return `Nobody signs their own change: you are barred as owner of item ${item}.`;
}

test.describe("wrong role", () => {
  test("an owner, an auditor and an administrator cannot sign as reviewer or as program manager", async ({
    as,
    refuses,
  }) => {
    const tansy = await as("tansy");
    const proposal = await proposed(tansy, smallChange(tansy, "010"));
    const shown = await sheetBefore(await as("ines"), proposal);
    for (const name of ["odo", "maud", "ada"] as const) {
      const person = await as(name);
      const recorded = { act: "approve_proposal", by: person };
      await refuses(() => sign(person, proposal, shown), { code: "forbidden", sentence: REVIEWERS_SIGN, recorded });
      const asManager = () => sign(person, proposal, shown, { capacity: "program_manager" });
      await refuses(asManager, { code: "forbidden", sentence: MANAGERS_SIGN, recorded });
    }
  });

  test("a program manager cannot fill the reviewer's place, nor a reviewer the manager's", async ({ as, refuses }) => {
    const [tansy, lusia, ines] = [await as("tansy"), await as("lusia"), await as("ines")];
    const proposal = await proposed(tansy, smallChange(tansy, "010"));
    const shown = await sheetBefore(ines, proposal);
    await refuses(() => sign(lusia, proposal, shown), {
      code: "forbidden",
      sentence: REVIEWERS_SIGN,
      recorded: { act: "approve_proposal", by: lusia },
    });
    await refuses(() => sign(ines, proposal, shown, { capacity: "program_manager" }), {
      code: "forbidden",
      sentence: MANAGERS_SIGN,
      recorded: { act: "approve_proposal", by: ines },
    });
  });

  test("an auditor starts no draft and edits none", async ({ as, refuses }) => {
    const [tansy, maud] = [await as("tansy"), await as("maud")];
    const draft = await drafted(tansy, smallChange(tansy, "010"));
    await refuses(() => startDraft(maud), {
      code: "forbidden",
      sentence: "Only a component owner or a program manager of this product may start a proposal.",
      recorded: { act: "start_draft", by: maud },
    });
    await refuses(() => saveDraft(maud, { ...draft, content: smallChange(tansy, "010") }), {
      code: "forbidden",
      status: 403,
      sentence:
        "Only the proposer and the named co-editors may change this draft, while they are component owner or program manager here.",
      recorded: { act: "save_draft", by: maud },
    });
  });

  test("an owner cannot edit an item that somebody else owns, not even into a draft", async ({ as, refuses }) => {
    const [tansy, odo] = [await as("tansy"), await as("odo")];
    const draft = await drafted(odo, content([]));
    await refuses(() => saveDraft(odo, { ...draft, content: smallChange(tansy, "010") }), {
      code: "forbidden",
      status: 403,
      sentence: "A component owner may revise items that they own; any other line needs a program manager.",
      recorded: { act: "save_draft", by: odo },
    });
  });
});

test.describe("one's own signature", () => {
  test("the proposer is barred", async ({ as, refuses }) => {
    const [roel, ines] = [await as("roel"), await as("ines")];
    const proposal = await proposed(roel, smallChange(roel, "040"));
    await refuses(async () => sign(roel, proposal, await sheetBefore(ines, proposal)), {
      code: "not_independent",
      sentence: "Nobody signs their own change: you are barred as its proposer and as owner of item 040.",
      recorded: { act: "approve_proposal", by: roel },
    });
  });

  test("a co-editor is barred who saved one word of it", async ({ as, refuses }) => {
    const [tansy, roel, ines] = [await as("tansy"), await as("roel"), await as("ines")];
    const { proposalId, lockVersion } = await drafted(tansy, smallChange(tansy, "010"));
    valueOf(await share(tansy, proposalId, roel.userId), z.unknown());
    const retitled = { ...smallChange(tansy, "010"), title: "Another word" };
    const saved = valueOf(
      await saveDraft(roel, { proposalId, lockVersion, content: retitled }),
      z.object({ outcome: z.literal("saved"), lockVersion: z.int() }),
    );
    const submitted = await propose(tansy, { proposalId, lockVersion: saved.lockVersion });
    const proposal: SubmittedProposal = { proposalId, ...valueOf(submitted, z.object({ key: z.string() })) };

    const shown = await sheetBefore(ines, proposal);
    await refuses(() => sign(roel, proposal, shown), {
      code: "not_independent",
      sentence: "Nobody signs their own change: you are barred as one who edited it.",
      recorded: { act: "approve_proposal", by: roel },
    });
  });

  test("the owner of an edited item is barred, before and after the change", async ({ as, refuses }) => {
    const [fenno, roel, odo, ines] = [await as("fenno"), await as("roel"), await as("odo"), await as("ines")];
    const changes = [
      { proposal: await proposed(fenno, smallChange(roel, "040")), item: "040" },
      { proposal: await proposed(fenno, smallChange(odo, "040")), item: "040" },
      { proposal: await proposed(fenno, smallChange(roel, "020")), item: "020" },
    ];
    for (const { proposal, item } of changes) {
      const shown = await sheetBefore(ines, proposal);
      await refuses(() => sign(roel, proposal, shown), {
        code: "not_independent",
        sentence: ownership(item),
        recorded: { act: "approve_proposal", by: roel },
      });
    }
  });
});

test.describe("wrong product", () => {
  test("every role in another product gives no right in this one", async ({ as, refuses }) => {
    const [tansy, otto] = [await as("tansy"), await as("otto")];
    const proposal = await proposed(tansy, smallChange(tansy, "010"));
    const shown = await sheetBefore(await as("ines"), proposal);
    const recorded = { act: "approve_proposal", by: otto };
    await refuses(() => sign(otto, proposal, shown), { code: "forbidden", sentence: REVIEWERS_SIGN, recorded });
    await refuses(() => sign(otto, proposal, shown, { capacity: "program_manager" }), {
      code: "forbidden",
      sentence: MANAGERS_SIGN,
      recorded,
    });
    await refuses(() => startDraft(otto), {
      code: "forbidden",
      sentence: "Only a component owner or a program manager of this product may start a proposal.",
      recorded: { act: "start_draft", by: otto },
    });
  });

  test("a draft cannot be saved by way of the product in which one holds a role", async ({ as, refuses }) => {
    const [tansy, otto] = [await as("tansy"), await as("otto")];
    const draft = await drafted(tansy, smallChange(tansy, "010"));
    await refuses(
      () => saveDraft(otto, { ...draft, content: smallChange(tansy, "010") }, { productCode: OTHER_PRODUCT }),
      {
        code: "forbidden",
        status: 403,
        sentence:
          "Only the proposer and the named co-editors may change this draft, while they are component owner or program manager here.",
        recorded: { act: "save_draft", by: otto },
      },
    );
  });
});

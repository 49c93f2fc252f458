import { expect } from "@playwright/test";
import { z } from "zod";
import { run } from "../support/http-acts";
import { valueOf } from "../support/http-answer";
import { nobody } from "../support/http-person";
import { storedState } from "../support/http-tables";
import { test } from "../support/http-test";

const ASKED = { issue: 2, operatingPoint: "OP-1", draws: 20_000, seed: 1 };
const DRAWERS_RUN = "Only a component owner, a reviewer or a program manager of this product may run Monte Carlo.";

test("an auditor, a member of another product and who is signed out draw nothing", async ({
  application,
  as,
  refuses,
}) => {
  for (const name of ["maud", "otto", "ada"] as const) {
    const by = await as(name);
    const recorded = { act: "run_monte_carlo", by };
    await refuses(() => run(by, ASKED), { code: "forbidden", status: 403, sentence: DRAWERS_RUN, recorded });
  }
  const sentence = "You are signed out. Sign in again.";
  await refuses(() => run(nobody(application.address), ASKED), { code: "forbidden", status: 401, sentence });
});

test("a run of what is not there, of too few or too many draws, or from another site is refused", async ({
  as,
  refuses,
}) => {
  const ines = await as("ines");
  for (const [more, sentence] of [
    [{ issue: 99 }, "There is no issue 99 of this budget."],
    [{ operatingPoint: "OP-9" }, "Issue 2 has no operating point OP-9 in force."],
  ] as const) {
    await refuses(() => run(ines, { ...ASKED, ...more }), { code: "not_found", status: 404, sentence });
  }
  for (const [draws, sentence] of [
    [10, /^At least 1000 draws/],
    [1e9, /^At most 1000000 draws/],
    [1000.5, "Give a whole number of draws."],
  ] as const) {
    await refuses(() => run(ines, { ...ASKED, draws }), { code: "invalid", status: 400, sentence, at: "draws" });
  }
  await refuses(() => run(ines, ASKED, { "sec-fetch-site": "cross-site" }), {
    code: "invalid",
    status: 403,
    sentence: "This request did not come from a page of this address.",
  });
});

test("who takes part draws: the answer tells how far it is, and the run is kept once", async ({
  application,
  as,
  refuses,
}) => {
  const ines = await as("ines");
  const lines = valueOf(await run(ines, ASKED), z.array(z.looseObject({ type: z.string() })));
  const counts = lines.filter(({ type }) => type === "progress").map(({ done }) => Number(done));
  expect(counts.length).toBeGreaterThan(1);
  expect(counts).toEqual(counts.toSorted((one, other) => one - other));
  expect(lines.at(-1)).toMatchObject({ type: "done", value: { issue: 2 } });
  expect((await storedState(application.dataFolder)).tables.monte_carlo_runs).toHaveLength(1);

  await refuses(() => run(ines, ASKED), {
    code: "duplicate",
    status: 409,
    sentence: "This seed was drawn as often already: the same would come out. Choose another seed.",
    at: "seed",
  });
});

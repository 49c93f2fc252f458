import { drafted, propose } from "../support/http-acts";
import { adding, content, LIMIT, plate, point, RESERVE, share } from "../support/http-bodies";
import { test } from "../support/http-test";

/** As printed: two decimals, a thin space before the unit. */
function newtons(hundredths: number): string {
  return `${(hundredths / 100).toFixed(2)}\u2009N`;
}

for (const [typed, value] of [
  ["0 km/h", 0],
  ["-90 km/h", -25],
] as const) {
  test(`a speed of ${typed} is refused at its field`, async ({ as, refuses }) => {
    const lusia = await as("lusia");
    const body = point({ speed: { value, entered: typed } });
    const edit = { operation: "revise", kind: "operating_point", number: "OP-1", baseLetter: "–", body } as const;
    const draft = await drafted(lusia, content([edit]));
    await refuses(() => propose(lusia, draft), {
      code: "invalid",
      sentence: /^(Operating point OP-1, Speed: )?Must be greater than 0\.$/,
      at: "edits.0.body.speed",
    });
  });
}

for (const [number, length, beside] of [
  ["069", { value: 2, entered: "2 kg" }, "with a value"],
  ["070", { entered: "2 kg" }, "without a value"],
] as const) {
  test(`a length of 2 kg ${beside} beside it is refused at its field`, async ({ as, refuses }) => {
    const tansy = await as("tansy");
    const draft = await drafted(tansy, content([adding(number, plate(tansy.userId, length))]));
    await refuses(() => propose(tansy, draft), { code: "invalid", sentence: /kg.*length/, at: "edits.0.body.length" });
  });
}

test("a Reynolds number outside every line gives no result, and no proposal", async ({ as, refuses }) => {
  const tansy = await as("tansy");
  // 25 m/s in air along 100 000 km.
  const draft = await drafted(tansy, content([adding("071", plate(tansy.userId, { value: 1e8 }))]));
  await refuses(() => propose(tansy, draft), {
    code: "evaluation_refused",
    sentence: /^Item 071 has no result at OP-1\. Re .* at the end of the layer is outside every friction line/,
    at: "edits.0.body",
  });
});

test("shares that would be shares of one another are refused", async ({ as, refuses }) => {
  const tansy = await as("tansy");
  const edits = [adding("072", share(tansy.userId, ["073"])), adding("073", share(tansy.userId, ["072"]))];
  const draft = await drafted(tansy, content(edits));
  await refuses(() => propose(tansy, draft), {
    code: "invalid",
    sentence: /^A share would depend on itself: 072 → 073 → 072\./,
  });
});

test("nobody gets more than is unallocated", async ({ as, refuses }) => {
  const lusia = await as("lusia");
  const giver = { kind: "unallocated", number: null } as const;
  const receiver = { kind: "item", number: "010" } as const;
  const draft = await drafted(lusia, content([], [{ giver, receiver, hundredths: LIMIT - RESERVE + 1_000 }]));
  await refuses(() => propose(lusia, draft), {
    code: "conservation",
    sentence: `Unallocated would have to give ${newtons(1_000)} more than it holds.`,
    at: "transfers",
    recorded: { act: "propose", by: lusia },
  });
});

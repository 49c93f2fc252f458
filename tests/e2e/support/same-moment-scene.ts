// A script of its own: the domain cannot be loaded into the process of the tests.
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import type { Actor } from "@/lib/vocabulary/actor";
import { adding, bluff, content, revising } from "./http-bodies";
import { PRODUCT } from "./http-people";
import { RACES, TIMES } from "./races";
import { actor, approve, clock, drafted, establish, openProduct, proposed, setScene } from "./scene-parts";

/** Everything that two persons are about to do at one moment, as often as it is to be tried. */
setScene(async () => {
  await openProduct(PRODUCT);
  await establish();
  const [tansy, odo] = [await actor("tansy"), await actor("odo")];
  await approveItems(tansy, odo);
  for (let count = 1; count <= TIMES; count += 1) {
    await twoSubmits(tansy, odo);
    await twoCarries(tansy, odo);
  }
});

async function approveItems(tansy: Actor, odo: Actor): Promise<void> {
  const bodies = ["010", "020", "030"].map((number) => adding(number, bluff(tansy.userId, 0.5)));
  const lamp = adding("040", bluff(odo.userId, 0.5));
  const proposalId = await proposed(await actor("fenno"), content([...bodies, lamp]));
  await approve("ines", proposalId, "reviewer");
  await approve("lusia", proposalId, "program_manager");
}

/** From 0.50 to 0.80 on 0.1 m² at 383 Pa: more than 1 % of the limit of 200 N, so a program manager signs besides. */
async function twoSubmits(tansy: Actor, odo: Actor): Promise<void> {
  const typed = { ...content([revising("010", bluff(tansy.userId, 0.8))]), title: RACES.submits };
  const proposalId = await drafted(tansy, typed);
  await shareDraft(tansy, { proposalId, userId: odo.userId }, clock);
}

async function twoCarries(tansy: Actor, odo: Actor): Promise<void> {
  const typed = { ...content([revising("020", bluff(tansy.userId, 0.45))]), title: RACES.carries };
  const proposalId = await drafted(tansy, typed);
  await shareDraft(tansy, { proposalId, userId: odo.userId }, clock);
}

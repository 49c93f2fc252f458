// A script of its own: the domain cannot be loaded into the process of the tests.
import { adding, bluff, content } from "./http-bodies";
import { OTHER_PRODUCT, PRODUCT } from "./http-people";
import { actor, approve, establish, openProduct, proposed, setScene } from "./scene-parts";

/** Two products, one of them established and with an item for each kind of test. */
setScene(async () => {
  await openProduct(PRODUCT);
  await openProduct(OTHER_PRODUCT);
  await establish();
  await approveItems();
});

/**
 * Items 010 and 020 that keep their first letter, 040 of a reviewer, and those of which one test each approves a
 * revision: 030 beside an open sheet, 050 that overtakes, 060 that two persons sign at one moment.
 */
async function approveItems(): Promise<void> {
  const [tansy, odo, roel] = [await actor("tansy"), await actor("odo"), await actor("roel")];
  const items = Object.entries({ "010": tansy, "020": odo, "030": odo, "040": roel, "050": tansy, "060": tansy });
  const edits = items.map(([number, { userId }]) => adding(number, bluff(userId, 0.5)));

  const proposalId = await proposed(await actor("fenno"), content(edits));
  await approve("ines", proposalId, "reviewer");
  await approve("lusia", proposalId, "program_manager");
}

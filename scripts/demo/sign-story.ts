import { TERMS_NUMBER } from "@/lib/evaluation/lines/terms-body";
import type { DemoHouse } from "./demo-house";
import { drawRun } from "./drawn-run";
import { degreesCelsius, metresPerSecond, squareMetres } from "./item-draft";
import { citation, firstSheet, revised } from "./line-edits";
import { SIGN } from "./products";
import { proposalActs, type ProposalActs } from "./proposal-acts";
import { ROUGH_ON_PURPOSE, SIGN_GROUPS, SIGN_ITEMS } from "./sign-items";

const CODE = SIGN.product.code;

/** GS4, over: 20.3 N above its limit with growth, though the basic estimates alone would fit. */
export async function tellSignStory(house: DemoHouse): Promise<void> {
  const acts = proposalActs(house, CODE);
  await bookFirstSheet(house, acts);
  await settleOperatingPoint(house, acts);
  await judgeRearFace(house, acts);
  await thinOutStiffeners(house, acts);
  await askForLimit(house, acts);
  await moveJunctionBox(house, acts);
  await mistakeReferenceArea(house, acts);
  house.at(4, "14:05");
  await drawRun(house, "ines", CODE);
}

async function bookFirstSheet(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(130, "09:30");
  const proposal = await acts.submit("fenno", {
    title: "First sheet: panel, frame and attachments",
    reason: "Opens the budget for the edge-on service wind, for screening of vibration only.",
    ...firstSheet(house, { groups: SIGN_GROUPS, items: SIGN_ITEMS }, 150),
  });
  house.at(128, "10:40");
  await acts.approve("ines", "reviewer", proposal);
  await acts.approve("lusia", "program_manager", proposal);
}

async function settleOperatingPoint(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(112, "09:05");
  const faster = await acts.submit("fenno", {
    title: "Service wind 20 to 22 m/s, 1.5 N from the reserve",
    reason:
      "The road authority's vibration guideline names 22 m/s along the panel. 1.5 N of the reserve were held back for " +
      "that very question: they are drawn now and stay unallocated until the attachments are drawn.",
    edits: [
      await revised(CODE, "operating_point", "OP-1", { speed: metresPerSecond(22) }),
      await revised(CODE, "terms", TERMS_NUMBER, { reserves: [{ operatingPoint: "OP-1", hundredths: 1500 }] }),
    ],
  });
  house.at(110, "14:15");
  await acts.approve("bram", "reviewer", faster);
  await acts.approve("lusia", "program_manager", faster);

  house.at(96, "10:25");
  const facts = { title: "Air of the windy months", reason: "The guideline's mean over strong-wind hours." };
  const at = (celsius: number) =>
    revised(CODE, "operating_point", "OP-1", { staticTemperature: degreesCelsius(celsius) });
  const colder = await acts.submit("fenno", { ...facts, edits: [await at(0)] });
  house.at(95, "09:55");
  await acts.giveBack("elske", colder, "The guideline's table 3 says 5 °C; 0 °C is its coldest month.");
  await acts.submitAgain("fenno", colder, { ...facts, edits: [await at(5)] });
  house.at(94, "11:30");
  await acts.approve("elske", "reviewer", colder);
  await acts.approve("lusia", "program_manager", colder);
}

async function judgeRearFace(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(54, "09:40");
  const rough = {
    frictionLine: "fully-rough",
    justifications: [{ code: "fully-rough-line-on-smoother-surface", text: ROUGH_ON_PURPOSE, excess: 0 }],
  };
  const proposal = await acts.submit("odo", {
    title: "Rear face recomputed as rough",
    reason: "The zinc of 150 µm stands well above the 62 µm that would be harmless at 22 m/s. Adds 3.43 N.",
    edits: [await revised(CODE, "item", "020", rough)],
  });
  house.at(53, "15:20");
  await acts.approve("ines", "reviewer", proposal);
  house.at(51, "10:10");
  await acts.approve("lusia", "program_manager", proposal);
}

async function thinOutStiffeners(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(22, "13:35");
  const evidence = [citation("Layout GS4-LA-06", "C", house.day(24))];
  const three = { name: "Rear stiffeners (3)", referenceArea: squareMetres(0.432), evidence };
  const proposal = await acts.submit("tansy", {
    title: "Rear stiffeners 5 to 3",
    reason: "Three deeper sections carry the panel. Brings the budget back inside by 13.5 N.",
    neededBy: house.day(-5),
    edits: [await revised(CODE, "item", "060", three)],
  });
  house.at(21, "10:50");
  await acts.remark("bram", proposal, {
    text: "Deflection check document GS4-ST-09 from the licensed engineer must be on file first.",
    line: { kind: "item", number: "060" },
    field: "evidence",
    asksForAction: true,
  });
}

async function askForLimit(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(17, "09:45");
  const proposal = await acts.submit("fenno", {
    title: "Limit 290 to 325 N",
    reason: "The gantry's damper was chosen for 340 N. The sponsor's signature is still missing.",
    edits: [await revised(CODE, "operating_point", "OP-1", { limitHundredths: 32500 })],
  });
  house.at(16, "08:40");
  await acts.remark("lusia", proposal, { text: "Put off to the next board: decide the stiffeners first." });
  await acts.object(
    "odo",
    proposal,
    "A higher limit hides what the stiffeners cost; the fatigue of the arms is the same.",
  );
}

async function moveJunctionBox(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(8, "16:10");
  const moved = { shelterFactor: 0.25, shelterReason: "It stands behind the chord since it was moved." };
  const proposal = await acts.submit("tansy", {
    title: "Junction box behind the chord",
    reason: "Moved after a vehicle struck the gantry. The work is done; the sheet has to follow.",
    neededBy: house.day(-2),
    edits: [await revised(CODE, "item", "100", moved)],
  });
  house.at(7, "09:15");
  await acts.remark("elske", proposal, {
    text: "Photographs of the new place, please, before I sign.",
    asksForAction: true,
  });
}

async function mistakeReferenceArea(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(6, "11:05");
  const proposal = await acts.submit("odo", {
    title: "Upwind edge on the area of the panel",
    reason: "Refers the edge's coefficient to the 14.4 m² of the face like the other sheets of the gantry.",
    edits: [await revised(CODE, "item", "040", { referenceArea: squareMetres(14.4) })],
  });
  await acts.remark("ines", proposal, {
    text: "Wrong reference area, a factor of 50: the coefficient is published for the edge.",
    line: { kind: "item", number: "040" },
    field: "referenceArea",
  });
  house.at(5, "09:20");
  await acts.disapprove("lusia", proposal, "The coefficient belongs to the area of the edge.");
}

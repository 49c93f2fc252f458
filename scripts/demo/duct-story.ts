import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import type { DemoHouse } from "./demo-house";
import { DUCT_GROUPS, DUCT_ITEMS } from "./duct-items";
import { degreesCelsius, metresPerSecond } from "./item-draft";
import { added, citation, firstSheet, fromItem, revised, toItem } from "./line-edits";
import { DUCT } from "./products";
import { proposalActs, type ProposalActs } from "./proposal-acts";

const CODE = DUCT.product.code;

/** PD7, comfortable: 29.5 N clear of the reserve, and proposals about method more than about newtons. */
export async function tellDuctStory(house: DemoHouse): Promise<void> {
  const acts = proposalActs(house, CODE);
  await bookFirstSheet(house, acts);
  await settleOperatingPoints(house, acts);
  await measureDamper(house, acts);
  await passOverHatches(house, acts);
  await tripBaffles(house, acts);
  await openScreen(house, acts);
  await dropVanes(house, acts);
  await raiseCoreSpeed(house, acts);
}

async function bookFirstSheet(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(148, "09:15");
  const proposal = await acts.submit("fenno", {
    title: "First sheet: runs, inserts and fittings",
    reason: "Opens the budget. Filters, coil and fan are excluded; leakage is booked as flow, not as drag.",
    ...firstSheet(house, { groups: DUCT_GROUPS, items: DUCT_ITEMS }, 170),
  });
  house.at(146, "14:00");
  await acts.approve("elske", "reviewer", proposal);
  house.at(145, "09:20");
  await acts.approve("lusia", "program_manager", proposal);
}

async function settleOperatingPoints(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(126, "10:30");
  const warmer = await acts.submit("fenno", {
    title: "Drying temperature 35 to 40 °C",
    reason: "The paint's maker asks for 40 °C at the first nozzle row.",
    edits: [await revised(CODE, "operating_point", "OP-1", { staticTemperature: degreesCelsius(40) })],
  });
  house.at(125, "09:10");
  await acts.approve("ines", "reviewer", warmer);
  await acts.approve("lusia", "program_manager", warmer);

  house.at(101, "11:00");
  const point = {
    ...newOperatingPoint(),
    name: "Cold start, 8.0 m/s bulk, 20 °C",
    staticTemperature: degreesCelsius(20),
    speed: metresPerSecond(8),
    hoursPerYear: 120,
  };
  const cold = await acts.submit("fenno", {
    title: "Operating point OP-2: cold start at 20 °C",
    reason: "The denser air of a cold start has to stay inside the fan's pressure too.",
    edits: [added("operating_point", "OP-2", point)],
  });
  house.at(100, "09:45");
  await acts.approve("ines", "reviewer", cold);
  house.at(99, "08:30");
  await acts.approve("lusia", "program_manager", cold);
}

async function measureDamper(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(61, "13:15");
  const measured = {
    lossCoefficient: 0.19,
    source: "Bench sheet PD7-BS-02 of a damper of the same series",
    grade: "measured_like_part",
    evidence: [citation("Bench sheet PD7-BS-02", "–", house.day(66))],
  };
  const proposal = await acts.submit("odo", {
    title: "Balancing damper: K 0.22 to 0.19 from the bench",
    reason: "Measured on a damper of the same series. Gives 3.5 N back to the unallocated rest.",
    edits: [await revised(CODE, "item", "090", measured)],
    transfers: [fromItem("090", 3.5)],
  });
  house.at(60, "10:00");
  await acts.approve("ines", "reviewer", proposal);
  house.at(59, "16:20");
  await acts.approve("lusia", "program_manager", proposal);
}

/** Stays overtaken: while it waited, the line it edits got its next revision. */
async function passOverHatches(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(40, "11:40");
  await acts.submit("odo", {
    title: "Hatches with flush lids",
    reason: "Flush lids halve the steps of the three hatches.",
    edits: [await revised(CODE, "item", "110", { lossCoefficient: 0.02, basis: "Three flush lids, four flanges." })],
  });
  house.at(33, "09:35");
  const proposal = await acts.submit("fenno", {
    title: "Hatches: source by its newest revision",
    reason: "The note was revised without a change of its numbers.",
    edits: [
      await revised(CODE, "item", "110", { source: "Judgement of the aerodynamics group, note TH-AN-36 revision B" }),
    ],
  });
  house.at(32, "14:10");
  await acts.approve("elske", "reviewer", proposal);
}

async function tripBaffles(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(27, "09:50");
  // The cold start has made the note reach further than it was justified at first.
  const stillCovered = {
    code: "roughness-above-admissible",
    text: "The wool stands behind a perforated sheet, which is smooth itself; that holds at the cold start too.",
    excess: 0,
  };
  const proposal = await acts.submit("tansy", {
    title: "Splitter baffles turbulent from the edge",
    reason: "A perforated face trips the layer. Needs 0.3 N from the unallocated rest.",
    neededBy: house.day(-9),
    edits: [await revised(CODE, "item", "050", { transition: "tripped", justifications: [stillCovered] })],
    transfers: [toItem("050", 0.3)],
  });
  await acts.remark("odo", proposal, { text: "The 0.3 N are free: the damper gave back ten times that." });
  house.at(26, "14:40");
  await acts.remark("ines", proposal, {
    text: "State the transition Reynolds number and the constant 1742 of the sheet before, not 1700.",
    line: { kind: "item", number: "050" },
    field: "criticalReynolds",
    asksForAction: true,
  });
}

async function openScreen(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(19, "10:10");
  const proposal = await acts.submit("tansy", {
    title: "Turbulence screen with a wider mesh",
    reason: "K 0.60 to 0.48 with a mesh of 64 % open area; the nozzles stand it.",
    edits: [
      await revised(CODE, "item", "100", { lossCoefficient: 0.48, source: "Offer of the screen's maker, sheet 8" }),
    ],
  });
  house.at(18, "09:30");
  await acts.remark("elske", proposal, {
    text: "On condition of the supplier's calibration, due in 15 working days.",
    line: { kind: "item", number: "100" },
    field: "source",
    asksForAction: true,
  });
}

async function dropVanes(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(16, "15:05");
  const proposal = await acts.submit("tansy", {
    title: "Turning vanes 12 to 8",
    reason: "Four vanes fewer save 0.5 N and a day of welding.",
    edits: [await revised(CODE, "item", "070", { name: "Turning vanes (8)", faces: 16 })],
  });
  house.at(15, "11:25");
  await acts.remark("bram", proposal, {
    text: "The gap-chord ratio leaves the tabulated bend loss; the saving is 0.5 N, the risk larger.",
    line: { kind: "item", number: "070" },
    field: "faces",
  });
  house.at(14, "09:00");
  await acts.disapprove("lusia", proposal, "The bend loss of 080 would no longer be covered by its table.");
}

async function raiseCoreSpeed(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(4, "10:35");
  const faster = { localSpeedRatio: 1.0625, basis: "Core speed 8.50 m/s from a displacement thickness of 25.5 mm." };
  const proposal = await acts.submit("odo", {
    title: "Core speed at the end of run B 8.24 to 8.50 m/s",
    reason: "The layers grow along run B too; the core gets faster towards its end.",
    edits: [await revised(CODE, "item", "030", faster), await revised(CODE, "item", "040", faster)],
  });
  house.at(3, "13:50");
  await acts.remark("ines", proposal, {
    text: "Use the mean over the run, not the value at its end.",
    line: { kind: "item", number: "030" },
    field: "localSpeedRatio",
  });
}

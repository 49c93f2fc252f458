import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { makeBaseline } from "@/lib/products/make-baseline";
import { nameDeputy } from "@/lib/products/name-deputy";
import { BRACKET_DRAWING, TRIM_DRAWING, TRIM_READINGS } from "./demo-files";
import type { DemoHouse } from "./demo-house";
import { drawRun } from "./drawn-run";
import { FAIRING_GROUPS, FAIRING_ITEMS } from "./fairing-items";
import { degreesCelsius, metresPerSecond, squareMetres } from "./item-draft";
import { added, citation, firstSheet, fromItem, revised } from "./line-edits";
import { DEMO_PASSWORD } from "./people";
import { FAIRING } from "./products";
import { proposalActs, type ProposalActs } from "./proposal-acts";

const CODE = FAIRING.product.code;

/** TF2, tight: 1.41 N clear of the reserve, and the open proposals would use or find more than that. */
export async function tellFairingStory(house: DemoHouse): Promise<void> {
  const acts = proposalActs(house, CODE);
  await bookFirstSheet(house, acts);
  await raiseSpeed(house, acts);
  await thinOutBrackets(house, acts);
  await releasePreliminaryDesign(house);
  await joinPanels(house, acts);
  await raiseNoseCap(house, acts);
  await roundTrim(house, acts);
  await askInsideItem(house, acts);
  await addColdPoint(house, acts);
  await leaveDraft(house, acts);
  house.at(1, "11:40");
  await drawRun(house, "lusia", CODE);
  await nameHolidayDeputy(house);
}

async function bookFirstSheet(house: DemoHouse, acts: ProposalActs): Promise<void> {
  const skin = FAIRING_ITEMS.filter(({ group }) => group === "G10" || group === "G20");
  const rest = FAIRING_ITEMS.filter((item) => !skin.includes(item));
  house.at(164, "09:10");
  const first = await acts.submit("fenno", {
    title: "First sheet: skin and edges",
    reason: "Opens the budget with the panels as drawn. Allocations as agreed in the kick-off.",
    ...firstSheet(house, { groups: FAIRING_GROUPS, items: skin }, 190),
  });
  house.at(163, "10:20");
  await acts.approve("ines", "reviewer", first);
  await acts.approve("lusia", "program_manager", first);

  house.at(157, "08:40");
  const second = await acts.submit("fenno", {
    title: "First sheet: fittings and openings",
    reason: "Completes the sheet. The form coefficients are the house table's.",
    ...firstSheet(house, { groups: [], items: rest }, 190),
  });
  house.at(155, "13:05");
  await acts.approve("ines", "reviewer", second);
  house.at(154, "09:30");
  await acts.approve("lusia", "program_manager", second);
}

async function raiseSpeed(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(120, "09:00");
  const proposal = await acts.submit("fenno", {
    title: "Reference speed 24 to 25 m/s",
    reason: "The customer's duty cycle is stated at 90 km/h. The limit stays, as the contract names it at that speed.",
    edits: [await revised(CODE, "operating_point", "OP-1", { speed: metresPerSecond(25) })],
  });
  await acts.remark("bram", proposal, { text: "The contract's annex B says 90 km/h as well. No objection." });
  house.at(118, "11:15");
  await acts.approve("ines", "reviewer", proposal);
  await acts.approve("lusia", "program_manager", proposal);
}

async function thinOutBrackets(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(75, "10:45");
  const evidence = [citation("Drawing 7731", "C", house.day(80), BRACKET_DRAWING)];
  const brackets = { name: "Under-floor brackets (18)", referenceArea: squareMetres(0.027), evidence };
  const proposal = await acts.submit("odo", {
    title: "Under-floor brackets 22 to 18",
    reason: "Four brackets were stiffened and the other four fall away. Gives 0.7 N back to the unallocated rest.",
    edits: [await revised(CODE, "item", "100", brackets)],
    transfers: [fromItem("100", 0.7)],
    files: [{ file: BRACKET_DRAWING, sourceDate: house.day(80) }],
  });
  house.at(74, "14:30");
  await acts.opens("ines", BRACKET_DRAWING);
  await acts.remark("ines", proposal, {
    text: "Evidence drawing 7731-C seen.",
    line: { kind: "item", number: "100" },
    field: "evidence",
  });
  await acts.approve("ines", "reviewer", proposal);
  house.at(72, "08:50");
  await acts.approve("lusia", "program_manager", proposal);
}

async function releasePreliminaryDesign(house: DemoHouse): Promise<void> {
  house.at(68, "16:00");
  const released = {
    productCode: CODE,
    issue: 5,
    name: "Preliminary design",
    purpose: "The budget on which the tools for the panels are ordered.",
  };
  const signed = { ...released, password: DEMO_PASSWORD };
  await makeBaseline(await house.actor("lusia"), signed, house.clock);
}

async function joinPanels(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(30, "09:25");
  const line = { frictionLine: "prandtl-schlichting" };
  const proposal = await acts.submit("tansy", {
    title: "Front and mid panels as one plate of 6.0 m",
    reason:
      "The joint is flush since drawing 7713-B, so the layer runs on from the front to the mid panels. " +
      "At 1.03 × 10⁷ the one-fifth law ends; both panels take Prandtl–Schlichting.",
    neededBy: house.day(-6),
    edits: [
      await revised(CODE, "item", "010", line),
      await revised(CODE, "item", "020", { ...line, runUpFollows: true, justifications: [], basis: "" }),
    ],
  });
  house.at(28, "15:10");
  await acts.remark("bram", proposal, { text: "No structural remark." });
  await acts.remark("ines", proposal, {
    text: "Accept only if the lower strip is treated alike: it starts at the same edge and ends beyond the range too.",
    asksForAction: true,
  });
}

async function raiseNoseCap(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(25, "10:05");
  const evidence = [citation("Layout TF2-LA-05", "B", house.day(40))];
  const proposal = await acts.submit("tansy", {
    title: "Nose cap: layout to preliminary",
    reason: "The cap stays laminar by its shape; the second layout has its final radius.",
    edits: [await revised(CODE, "item", "060", { grade: "preliminary", evidence })],
  });
  house.at(24, "16:00");
  const said = await acts.remark("ines", proposal, {
    text:
      "In the wake of a cab no laminar run is credible; turbulent it is about 1.0 N. " +
      "4.3 × 10⁵ is under the one-fifth range too: state your judgement.",
    line: { kind: "item", number: "060" },
    field: "transition",
  });
  await acts.giveBack(
    "ines",
    proposal,
    "No evidence for a laminar layer behind the cab; a layout is none for a grade.",
  );
  house.at(23, "08:35");
  await acts.remark(
    "tansy",
    proposal,
    { text: "Will reissue it as estimated, with a trip at the edge." },
    said.remarkId,
  );
}

async function roundTrim(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(14, "11:20");
  const evidence = [
    citation("Drawing 7741", "A", house.day(16), TRIM_DRAWING),
    citation("Readings of mould M-7741", "–", house.day(15), TRIM_READINGS),
  ];
  const proposal = await acts.submit("tansy", {
    title: "Wheel-aperture trim with a radius of 18 mm",
    reason: "The rounded trim was drawn and goes into the mould from serial 041 on.",
    neededBy: house.day(-3),
    edits: [await revised(CODE, "item", "070", { dragCoefficient: 0.2333, grade: "preliminary", evidence })],
    files: [
      { file: TRIM_DRAWING, sourceDate: house.day(16) },
      { file: TRIM_READINGS, sourceDate: house.day(15) },
    ],
  });
  house.at(13, "09:40");
  await acts.opens("elske", TRIM_DRAWING);
  const condition = await acts.remark("elske", proposal, {
    text: "The mould drawing has to show the radius before I sign.",
    line: { kind: "item", number: "070" },
    field: "evidence",
    asksForAction: true,
  });
  house.at(12, "10:15");
  await acts.remark(
    "tansy",
    proposal,
    { text: "Mould drawing M-7741 is filed with drawing 7741-A." },
    condition.remarkId,
  );
  house.at(11, "08:55");
  await acts.settle("elske", condition.remarkId, "Mould drawing M-7741 seen, radius 18 mm.");
}

async function askInsideItem(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(10, "13:30");
  const proposal = await acts.submit("tansy", {
    title: "Access-step recess with its lid",
    reason: "The lid leaves a lip. With it the recess needs 5.5 N; please raise its allocation along with the item.",
    edits: [await revised(CODE, "item", "120", { dragCoefficient: 0.3 })],
  });
  house.at(9, "09:05");
  await acts.disapprove("lusia", proposal, "Allocation goes by transfer: name the giver.");
}

async function addColdPoint(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(6, "14:20");
  const point = {
    ...newOperatingPoint(),
    name: "Winter, 90 km/h, −15 °C",
    staticTemperature: degreesCelsius(-15),
    speed: metresPerSecond(25),
    hoursPerYear: 400,
  };
  const proposal = await acts.submit("fenno", {
    title: "Operating point OP-2: winter at −15 °C",
    reason:
      "Customers with heaters run the same fairing in winter. Over the limit there, two items out of their range.",
    neededBy: house.day(-12),
    edits: [added("operating_point", "OP-2", point)],
  });
  house.at(5, "10:00");
  await acts.remark("lusia", proposal, { text: "For the board, together with the customers of the heater season." });
}

async function leaveDraft(house: DemoHouse, acts: ProposalActs): Promise<void> {
  house.at(2, "15:45");
  await acts.draft("odo", {
    title: "Latches flush with the skin",
    reason: "Eight of the sixteen latches can be sunk.",
    edits: [await revised(CODE, "item", "090", { referenceArea: squareMetres(0.0096) })],
  });
}

/** Next week's absence: the deputy is a reviewer themselves, and signs for the manager where nothing bars them. */
async function nameHolidayDeputy(house: DemoHouse): Promise<void> {
  house.at(1, "16:30");
  const named = { productCode: CODE, deputyId: house.idOf("bram"), fromDay: house.day(-7), untilDay: house.day(-14) };
  await nameDeputy(await house.actor("lusia"), named, house.clock);
}

import { describe, expect, it } from "vitest";
import { approvalTakenBack, approved, disapproved, returned, signed, withdrawn } from "@/templates/decided";
import { evidenceAdded, evidenceVoided } from "@/templates/evidence";
import { html } from "@/templates/html";
import { aheadChanged, leftPlannedBand, overtaken, reminder, superseded } from "@/templates/moved";
import { proposed } from "@/templates/proposed";
import { remarkAddressed, remarkAnswered, remarkAsksAction, remarkSettled } from "@/templates/remarks";

const frame = { recipientName: "Ines <script>", baseUrl: "http://127.0.0.1:3000/" };
const facts = { productCode: "TF2", productName: "Fairing & roof", label: "TF2-CP-04", proposalNumber: 4 };
const actor = { ...facts, actorName: "Tom" };
const remark = { ...facts, authorName: "Tom", remarkNumber: 3 };

const MAILS = {
  proposed: proposed(frame, {
    ...facts,
    ...{ proposerName: "Eva", round: 2, capacity: "program_manager", neededBy: "2026-12-20" },
  }),
  signed: signed(frame, { ...actor, capacity: "reviewer", stillNeeded: ["a program manager"] }),
  approved: approved(frame, { ...facts, issue: 14, signerNames: ["Tom, reviewer"] }),
  returned: returned(frame, actor),
  disapproved: disapproved(frame, actor),
  withdrawn: withdrawn(frame, actor),
  approvalTakenBack: approvalTakenBack(frame, actor),
  superseded: superseded(frame, {
    ...facts,
    proposerName: "Eva",
    signedRound: 1,
    round: 2,
    moved: ["Item 050 Mirrors"],
  }),
  overtaken: overtaken(frame, { ...facts, because: ["Item 050 has revision C since."] }),
  aheadChanged: aheadChanged(frame, { ...facts, issue: 14, behind: ["020 Mid panels, behind 010"] }),
  leftPlannedBand: leftPlannedBand(frame, { ...facts, issue: 14, operatingPoint: "OP-1", side: "above" }),
  reminder: reminder(frame, { ...facts, proposerName: "Eva", neededBy: "2026-12-20" }),
  remarkAddressed: remarkAddressed(frame, remark),
  remarkAsksAction: remarkAsksAction(frame, remark),
  remarkAnswered: remarkAnswered(frame, remark),
  remarkSettled: remarkSettled(frame, remark),
  evidenceAdded: evidenceAdded(frame, actor),
  evidenceVoided: evidenceVoided(frame, actor),
};

describe.each(Object.entries(MAILS))("the mail %s", (_, mail) => {
  it("names the proposal in its subject, on one line", () => {
    expect(mail.subject).toContain("TF2-CP-04");
    expect(mail.subject).not.toMatch(/[\r\n]/);
  });

  it("gives the link in both forms and says that answering approves nothing", () => {
    for (const body of [mail.text, mail.html]) {
      expect(body).toContain("http://127.0.0.1:3000/products/TF2/proposals/4");
      expect(body).toContain("Nothing can be approved by answering this mail");
    }
  });

  it("lets no name become markup", () => {
    expect(mail.html).not.toContain("<script>");
    expect(mail.html).toContain("Ines &lt;script&gt;");
    expect(mail.html).toContain("Fairing &amp; roof");
  });

  it("prints no figure of the budget", () => {
    expect(`${mail.subject} ${mail.text}`).not.toMatch(/\d\s?N\b|newton|%/);
  });
});

it("tells in which capacity somebody is asked, and by when; why is told on the sheet", () => {
  expect(MAILS.proposed.subject).toBe("TF2-CP-04 waits for a program manager's signature");
  expect(MAILS.proposed.text).toContain("asked as program manager");
  expect(MAILS.proposed.text).toContain("needed by 2026-12-20");
  expect(MAILS.proposed.text).toContain("(round 2)");
});

it("tells a signer what moved since they signed", () => {
  expect(MAILS.superseded.text).toContain("Your signature on round 1 stays visible and no longer counts");
  expect(MAILS.superseded.text).toContain("- Item 050 Mirrors");
});

it("escapes what is put into HTML, once", () => {
  const inner = html`<b title="${'"'}">${"a & b"}</b>`;
  expect(html`<p>${[inner, inner]}</p>`.text).toBe(
    '<p><b title="&quot;">a &amp; b</b>\n<b title="&quot;">a &amp; b</b></p>',
  );
});

import { describe, expect, it } from "vitest";
import { OutboxMessage } from "@/models/outbox-message";
import { withDatabase } from "@/tests/support/database";
import { approvedItems, approves, editOf, proposed, team } from "./review-cycle";

withDatabase();

function plate(ownerId: number, length: number, more: object = {}) {
  return {
    ...{ ownerId, grade: "estimated", methodVersion: 1, name: "Panels", group: null, order: 10 },
    ...{ method: "flat-plate-friction", length: { value: length }, breadth: { value: 0.95 }, faces: 2 },
    ...{ roughness: { value: 0 }, transition: "tripped", frictionLine: "prandtl-schlichting" },
    ...more,
  };
}

const edit = (operation: "add" | "revise", number: string, body: object) =>
  editOf({ operation, kind: "item", number, baseLetter: operation === "add" ? null : "–", body });

describe("the owner of a plate", () => {
  it("is told once when a plate ahead of theirs changed, and not of their own change", async () => {
    const people = await team();
    const { tansy, odo, ines, clock } = people;
    await approvedItems(people, [edit("add", "010", plate(tansy.userId, 2.4))]);
    await approvedItems(
      people,
      [edit("add", "020", plate(odo.userId, 2, { liesBehind: "010", runUpFollows: true, order: 20 }))],
      odo,
    );
    const told = () => OutboxMessage.findAll({ where: { template: "ahead_changed" } });
    expect(await told()).toEqual([]);

    const shorter = { title: "Shorter", edits: [edit("revise", "010", plate(tansy.userId, 2.39))] };
    const id = await proposed(tansy, clock, shorter);
    await approves(ines, id, "reviewer", clock);
    const mails = await told();
    expect(mails.map(({ toUserId }) => toUserId)).toEqual([odo.userId]);
    expect(JSON.parse(String(mails[0]?.data))).toMatchObject({ issue: 4, behind: ["020 Panels, behind 010"] });
  });
});

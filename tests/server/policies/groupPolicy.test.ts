import { describe, expect, it } from "vitest";
import type { Actor } from "../../../server/policies/actor";
import { groupAbilitiesOf, groupPolicy, type GroupFacts } from "../../../server/policies/groupPolicy";
import { groupActions } from "../../../shared/schemas/roles";

const someone: Actor = { id: "someone", name: "Someone", email: "someone@carrow.example" };

type Row = [who: string, actor: Actor | null, facts: GroupFacts, answers: string];

/** Columns: see, createNotebook, addMember, setRole, removeMember, leave. */
const table: Row[] = [
  ["signed out", null, { actorRole: null, leads: 1 }, "- - - - - -"],
  ["signed out, whatever a row says", null, { actorRole: "lead", leads: 2 }, "- - - - - -"],
  ["outside", someone, { actorRole: null, leads: 1 }, "- - - - - -"],
  ["guest", someone, { actorRole: "guest", leads: 1 }, "y - - - - y"],
  ["researcher", someone, { actorRole: "researcher", leads: 1 }, "y y - - - y"],
  ["one lead of two", someone, { actorRole: "lead", leads: 2 }, "y y y y y y"],
  ["the last lead", someone, { actorRole: "lead", leads: 1 }, "y y y y y -"],
];

describe("who may do what in a group", () => {
  it.each(table)("%s", (_who, actor, facts, answers) => {
    const said = groupActions.map((action) => (groupPolicy[action](actor, facts) ? "y" : "-")).join(" ");
    expect(said).toBe(answers);
  });

  it("the abilities sent along are the rules' answers", () => {
    for (const [, actor, facts] of table) {
      const abilities = groupAbilitiesOf(actor, facts);
      for (const action of groupActions) expect(abilities[action]).toBe(groupPolicy[action](actor, facts));
    }
  });
});

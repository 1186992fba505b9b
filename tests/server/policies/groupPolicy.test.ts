import { describe, expect, it } from "vitest";
import type { Actor } from "../../../server/policies/actor";
import { groupAbilitiesOf, groupPolicy, type GroupFacts } from "../../../server/policies/groupPolicy";
import { groupActions, servedGroupActions, type GroupAction } from "../../../shared/schemas/roles";

const someone: Actor = { id: "someone", name: "Someone", email: "someone@carrow.example" };

/** One column each: signed out whatever a row says, outside, guest, researcher, one lead of two, the last lead. */
const people: [actor: Actor | null, facts: GroupFacts][] = [
  [null, { actorRole: null, leads: 1 }],
  [null, { actorRole: "lead", leads: 2 }],
  [someone, { actorRole: null, leads: 1 }],
  [someone, { actorRole: "guest", leads: 1 }],
  [someone, { actorRole: "researcher", leads: 1 }],
  [someone, { actorRole: "lead", leads: 2 }],
  [someone, { actorRole: "lead", leads: 1 }],
];

const table: Record<GroupAction, string> = {
  see: "---yyyy",
  seeReferences: "---yyyy",
  createNotebook: "----yyy",
  rename: "-----yy",
  invite: "-----yy",
  revokeInvitation: "-----yy",
  setRole: "-----yy",
  removeMember: "-----yy",
  handOver: "-----yy",
  seeAudit: "-----yy",
  seeQueue: "-----yy",
  leave: "---yyy-",
};

describe("who may do what in a group", () => {
  it.each(groupActions)("%s", (action) => {
    const said = people.map(([actor, facts]) => (groupPolicy[action](actor, facts) ? "y" : "-")).join("");
    expect(said).toBe(table[action]);
  });

  it("what the page is told are the rules' answers, of what has a route", () => {
    for (const [actor, facts] of people) {
      const abilities = groupAbilitiesOf(actor, facts);
      expect(Object.keys(abilities).sort()).toEqual([...servedGroupActions].sort());
      for (const action of servedGroupActions)
        expect(abilities[action]).toBe(groupPolicy[action](actor, facts));
    }
  });
});

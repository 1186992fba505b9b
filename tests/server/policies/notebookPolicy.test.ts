import { describe, expect, it } from "vitest";
import type { Actor } from "../../../server/policies/actor";
import {
  notebookAbilitiesOf,
  notebookPolicy,
  notebookRoleOf,
  type NotebookFacts,
} from "../../../server/policies/notebookPolicy";
import { notebookActions, servedNotebookActions, type NotebookAction } from "../../../shared/schemas/roles";

const tamsin: Actor = { id: "tamsin", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };
const other: Actor = { id: "other", name: "Someone Else", email: "someone@else.example" };

const private_: NotebookFacts = {
  ownerId: "tamsin",
  isDeleted: false,
  isArchived: false,
  shareRole: null,
  groupRole: null,
  actorGroupRole: null,
  vetting: null,
};

type Who = [who: string, actor: Actor | null, facts: Partial<NotebookFacts>];

const vetting = { isOwnersAlone: false, groupLeads: 2 };
const vettingAlone = { isOwnersAlone: true, groupLeads: 2 };
const vettingAloneOnlyLead = { isOwnersAlone: true, groupLeads: 1 };

/** One column each, in this order. */
const people: Who[] = [
  ["signed out", null, { groupRole: "co-author" }],
  ["a stranger", other, { groupRole: "co-author" }],
  ["the owner", tamsin, {}],
  ["a co-author", other, { shareRole: "co-author" }],
  ["a commenter", other, { shareRole: "commenter" }],
  ["a reader", other, { shareRole: "reader" }],
  ["a researcher, nothing shared", other, { actorGroupRole: "researcher" }],
  ["a guest, nothing shared", other, { actorGroupRole: "guest" }],
  ["the lead, nothing shared", other, { actorGroupRole: "lead" }],
  ["the lead, in vetting", other, { actorGroupRole: "lead", vetting }],
  ["a lead, own alone, in vetting", tamsin, { actorGroupRole: "lead", vetting: vettingAlone }],
  ["the only lead, own alone, in vetting", tamsin, { actorGroupRole: "lead", vetting: vettingAloneOnlyLead }],
  ["a researcher, the group writes", other, { actorGroupRole: "researcher", groupRole: "co-author" }],
  ["a guest, the group writes", other, { actorGroupRole: "guest", groupRole: "co-author" }],
  ["the lead, the group reads", other, { actorGroupRole: "lead", groupRole: "reader" }],
];

/** Every action: live, archived, in the bin; a column for each of the people. */
const table: Record<NotebookAction, [live: string, archived: string, binned: string]> = {
  read: ["--yyyy----yyyyy", "--yyyy----yyyyy", "---------------"],
  export: ["--yyyy----yyyyy", "--yyyy----yyyyy", "---------------"],
  fork: ["--yyyy----yyyyy", "--yyyy----yyyyy", "---------------"],
  duplicate: ["--yyyy----yyyyy", "--yyyy----yyyyy", "---------------"],
  seeShares: ["--yyyy----yyyyy", "--yyyy----yyyyy", "---------------"],
  leave: ["---yyy---------", "---yyy---------", "---------------"],
  comment: ["--yyy-----yyy--", "---------------", "---------------"],
  resolveOwnThread: ["--yyy-----yyy--", "---------------", "---------------"],
  resolveAnyThread: ["--yy------yyy--", "---------------", "---------------"],
  edit: ["--yy------yyy--", "---------------", "---------------"],
  rename: ["--yy------yyy--", "---------------", "---------------"],
  keepVersion: ["--yy------yyy--", "---------------", "---------------"],
  restoreVersion: ["--yy------yyy--", "---------------", "---------------"],
  answerCautions: ["--yy------yyy--", "---------------", "---------------"],
  offer: ["--yy------yyy--", "---------------", "---------------"],
  takeOffers: ["--yy------yyy--", "---------------", "---------------"],
  requestVetting: ["--yy------yyy--", "---------------", "---------------"],
  share: ["--y-------yy---", "--y-------yy---", "---------------"],
  handOver: ["--y-------yy---", "--y-------yy---", "---------------"],
  move: ["--y-------yy---", "--y-------yy---", "---------------"],
  archive: ["--y-------yy---", "---------------", "---------------"],
  unarchive: ["---------------", "--y-------yy---", "---------------"],
  delete: ["--y-------yy---", "--y-------yy---", "---------------"],
  restoreFromBin: ["---------------", "---------------", "--y-------yy---"],
  readVersionInVetting: ["--yyyy---yyyyyy", "--yyyy---yyyyyy", "---------------"],
  vet: ["---------y-y---", "---------y-y---", "---------------"],
  publish: ["---------y-y---", "---------y-y---", "---------------"],
};

const states = [
  ["live", {}],
  ["archived", { isArchived: true }],
  ["in the bin", { isDeleted: true }],
  ["in the bin from the archive", { isDeleted: true, isArchived: true }],
] as const;

describe("who may do what with a notebook", () => {
  it.each(notebookActions)("%s", (action) => {
    for (const [state, stateFacts] of states) {
      const column = state === "live" ? 0 : state === "archived" ? 1 : 2;
      const said = people
        .map(([, actor, facts]) => notebookPolicy[action](actor, { ...private_, ...facts, ...stateFacts }))
        .map((may) => (may ? "y" : "-"))
        .join("");
      expect(said, `${action}, ${state}`).toBe(table[action][column]);
    }
  });

  it("what the page is told are the rules' answers, of what has a route", () => {
    for (const [, actor, facts] of people) {
      const notebook = { ...private_, ...facts };
      const abilities = notebookAbilitiesOf(actor, notebook);
      expect(Object.keys(abilities).sort()).toEqual([...servedNotebookActions].sort());
      for (const action of servedNotebookActions)
        expect(abilities[action]).toBe(notebookPolicy[action](actor, notebook));
    }
  });

  it("a guest who is co-author in person writes", () => {
    const facts = {
      ...private_,
      actorGroupRole: "guest",
      groupRole: "reader",
      shareRole: "co-author",
    } as const;
    expect(notebookPolicy.edit(other, facts)).toBe(true);
  });

  it("of a share in person and one with the group the greater counts", () => {
    const facts = { ...private_, actorGroupRole: "researcher", groupRole: "commenter" } as const;
    expect(notebookRoleOf(other, { ...facts, shareRole: "reader" })).toBe("commenter");
    expect(notebookRoleOf(other, { ...facts, shareRole: "co-author" })).toBe("co-author");
    expect(notebookRoleOf(other, { ...facts, shareRole: null })).toBe("commenter");
  });
});

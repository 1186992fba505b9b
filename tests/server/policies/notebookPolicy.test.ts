import { describe, expect, it } from "vitest";
import type { Actor } from "../../../server/policies/actor";
import {
  notebookAbilitiesOf,
  notebookPolicy,
  notebookRoleOf,
  type NotebookFacts,
} from "../../../server/policies/notebookPolicy";
import { notebookActions, type NotebookAction } from "../../../shared/schemas/roles";

const tamsin: Actor = { id: "tamsin", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };
const other: Actor = { id: "other", name: "Someone Else", email: "someone@else.example" };

const private_: NotebookFacts = {
  ownerId: "tamsin",
  isDeleted: false,
  shareRole: null,
  groupRole: null,
  actorGroupRole: null,
};

const may = (actor: Actor | null, facts: Partial<NotebookFacts>, action: NotebookAction): boolean =>
  notebookPolicy[action](actor, { ...private_, ...facts });

type Row = [who: string, actor: Actor | null, facts: Partial<NotebookFacts>, answers: string];

/** Columns: read, export, edit, rename, keepVersion, restoreVersion, delete, restoreFromBin. */
const table: Row[] = [
  ["signed out", null, {}, "- - - - - - - -"],
  ["signed out, shared with its group", null, { groupRole: "co-author" }, "- - - - - - - -"],
  ["no tie", other, {}, "- - - - - - - -"],
  ["no tie, shared with its group", other, { groupRole: "co-author" }, "- - - - - - - -"],
  ["owner", tamsin, {}, "y y y y y y y -"],
  ["owner who left the group", tamsin, { groupRole: "reader" }, "y y y y y y y -"],
  ["co-author", other, { shareRole: "co-author" }, "y y y y y y - -"],
  ["commenter", other, { shareRole: "commenter" }, "y y - - - - - -"],
  ["reader", other, { shareRole: "reader" }, "y y - - - - - -"],
  ["lead, private draft", other, { actorGroupRole: "lead" }, "- - - - - - - -"],
  ["lead, group reads", other, { actorGroupRole: "lead", groupRole: "reader" }, "y y - - - - - -"],
  ["lead, group comments", other, { actorGroupRole: "lead", groupRole: "commenter" }, "y y - - - - - -"],
  ["lead, group writes", other, { actorGroupRole: "lead", groupRole: "co-author" }, "y y y y y y - -"],
  ["researcher, private draft", other, { actorGroupRole: "researcher" }, "- - - - - - - -"],
  [
    "researcher, group reads",
    other,
    { actorGroupRole: "researcher", groupRole: "reader" },
    "y y - - - - - -",
  ],
  [
    "researcher, group writes",
    other,
    { actorGroupRole: "researcher", groupRole: "co-author" },
    "y y y y y y - -",
  ],
  ["guest, private draft", other, { actorGroupRole: "guest" }, "- - - - - - - -"],
  ["guest, group reads", other, { actorGroupRole: "guest", groupRole: "reader" }, "y y - - - - - -"],
  ["guest, group writes", other, { actorGroupRole: "guest", groupRole: "co-author" }, "y y - - - - - -"],
  [
    "guest who is co-author in person",
    other,
    { actorGroupRole: "guest", groupRole: "reader", shareRole: "co-author" },
    "y y y y y y - -",
  ],
  [
    "reader in person, group writes",
    other,
    { actorGroupRole: "researcher", groupRole: "co-author", shareRole: "reader" },
    "y y y y y y - -",
  ],
  ["signed out, in the bin", null, { isDeleted: true }, "- - - - - - - -"],
  ["no tie, in the bin", other, { isDeleted: true }, "- - - - - - - -"],
  ["owner, in the bin", tamsin, { isDeleted: true }, "- - - - - - - y"],
  ["co-author, in the bin", other, { isDeleted: true, shareRole: "co-author" }, "- - - - - - - -"],
  ["commenter, in the bin", other, { isDeleted: true, shareRole: "commenter" }, "- - - - - - - -"],
  ["reader, in the bin", other, { isDeleted: true, shareRole: "reader" }, "- - - - - - - -"],
  [
    "lead, in the bin",
    other,
    { isDeleted: true, actorGroupRole: "lead", groupRole: "co-author" },
    "- - - - - - - -",
  ],
];

describe("who may do what with a notebook", () => {
  it.each(table)("%s", (_who, actor, facts, answers) => {
    const said = notebookActions.map((action) => (may(actor, facts, action) ? "y" : "-")).join(" ");
    expect(said).toBe(answers);
  });

  it("the abilities sent along are the rules' answers", () => {
    for (const [, actor, facts] of table) {
      const notebook = { ...private_, ...facts };
      const abilities = notebookAbilitiesOf(actor, notebook);
      expect(Object.keys(abilities).sort()).toEqual([...notebookActions].sort());
      for (const action of notebookActions)
        expect(abilities[action]).toBe(notebookPolicy[action](actor, notebook));
    }
  });

  it("of a share in person and one with the group the greater counts", () => {
    const facts = { ...private_, actorGroupRole: "researcher", groupRole: "commenter" } as const;
    expect(notebookRoleOf(other, { ...facts, shareRole: "reader" })).toBe("commenter");
    expect(notebookRoleOf(other, { ...facts, shareRole: "co-author" })).toBe("co-author");
    expect(notebookRoleOf(other, { ...facts, shareRole: null })).toBe("commenter");
  });
});

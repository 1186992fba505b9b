import { describe, expect, it } from "vitest";
import type { Actor } from "../../../server/policies/actor";
import { referencePolicy, type ReferenceFacts } from "../../../server/policies/referencePolicy";
import { referenceActions, type ReferenceAction } from "../../../shared/schemas/roles";

const someone: Actor = { id: "someone", name: "Someone", email: "someone@carrow.example" };

/** One column each: signed out, outside, guest, researcher, lead. */
const people: [actor: Actor | null, role: ReferenceFacts["actorGroupRole"]][] = [
  [null, null],
  [someone, null],
  [someone, "guest"],
  [someone, "researcher"],
  [someone, "lead"],
];

const table: Record<ReferenceAction, [open: string, withinTheGroup: string]> = {
  read: ["yyyyy", "--yyy"],
  cite: ["yyyyy", "--yyy"],
  use: ["yyyyy", "--yyy"],
  supersede: ["----y", "----y"],
  withdraw: ["----y", "----y"],
  describe: ["----y", "----y"],
};

describe("who may do what with a reference", () => {
  it.each(referenceActions)("%s", (action) => {
    const said = [true, false].map((isPublic) =>
      people
        .map(([actor, actorGroupRole]) => referencePolicy[action](actor, { isPublic, actorGroupRole }))
        .map((may) => (may ? "y" : "-"))
        .join(""),
    );
    expect(said).toEqual(table[action]);
  });
});

import { expect, it } from "vitest";
import { personLine } from "../../../../src/features/account/personLine";

it.each([
  ["no group", [], "Pello Marrash"],
  [
    "one group, which they lead",
    [{ name: "Carrow Aeronomy", role: "lead" as const }],
    "Pello Marrash, lead of Carrow Aeronomy",
  ],
  ["one group", [{ name: "Carrow Aeronomy", role: "guest" as const }], "Pello Marrash, Carrow Aeronomy"],
  [
    "several groups",
    [
      { name: "Carrow Aeronomy", role: "guest" as const },
      { name: "Lomme", role: "lead" as const },
    ],
    "Pello Marrash",
  ],
])("names a person with %s", (_, groups, line) => {
  expect(personLine("Pello Marrash", groups)).toBe(line);
});
